import { landmark } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { useBench, useBenchDocument, useBenchModel } from '../bench-context.ts';
import { isDraft } from '../model/draft.ts';
import { marksOn } from '../model/bench-model.ts';
import { sideWords } from './side-words.ts';
import { LandmarkDrawing } from './landmark-drawing.tsx';

/** The landmark that is asked for: its name, where it is found, and how many there are on this frame. */
export function Asked({
  id,
  n,
  of,
  narrow,
}: {
  id: LandmarkId;
  n: number;
  of: number;
  narrow: boolean;
}) {
  const { view, current } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const here = marksOn(current, frame)[id];
  const { clip } = useBenchDocument();
  const draft = isDraft(current) ? current?.rep : null;
  const { label, where } = landmark(id);
  const first = label.charAt(0).toLowerCase() + label.slice(1);
  return (
    <>
      <p className="text-note leading-5 text-dusk-soft">
        {draft && !narrow ? 'Once, while both feet stand; ' : narrow ? '' : `Frame ${frame}, `}
        {n > 0 ? `${narrow ? 'Mark' : 'mark'} ${n} of ${of}` : narrow ? `Frame ${frame}` : 'extra'}
      </p>
      <h2 className="text-sub font-bold tablet:text-lead tablet:leading-[26px]">
        {here?.to === 'point' && here.looked ? 'Again' : 'Next'}: {first}
      </h2>
      <div className="bench-found">
        <LandmarkDrawing
          id={id}
          view={view}
          standingOn={current?.rep.supportSide ?? 'right'}
          width={narrow ? 64 : 88}
        />
        <p className="text-note leading-[21px]">
          {where}
          {here?.to === 'point' && !here.looked && ' Tracked here; nobody has looked yet.'}
          {here?.to === 'hidden' && ' Marked as hidden here.'}
          {draft && ` ${sideWords(id, draft, clip)}`}
          {narrow && ' Hold and slide; let go to place.'}
        </p>
      </div>
    </>
  );
}
