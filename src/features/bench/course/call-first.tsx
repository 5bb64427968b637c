import { ButtonLink } from '#src/ui/button-link.tsx';
import { paths } from '#src/ui/paths.ts';
import { supportWords } from '#src/ui/words.ts';
import { useBenchDocument, useBenchModel } from '../bench-context.ts';

/** Figures wait for the call by eye; marking does not. */
export function CallFirst() {
  const { visit } = useBenchDocument();
  const { current } = useBenchModel();
  if (!current) return null;
  const side = current.rep.supportSide;
  return (
    <div className="max-w-[34em] py-4">
      <h3 className="text-sub font-bold">First the eye, then the figures</h3>
      <p className="mt-1">
        There is no call by eye for {supportWords(side)} yet. Look at the clip and record what you
        saw, unsure counts too; then the course, the values and the reading are shown here. You can
        mark meanwhile.
      </p>
      <p className="mt-4">
        <ButtonLink look="primary" to={paths.call(visit.id, side)}>
          Record the call by eye
        </ButtonLink>
      </p>
    </div>
  );
}
