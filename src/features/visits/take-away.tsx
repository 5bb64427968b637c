import { useMutation } from '@tanstack/react-query';
import type { Clip } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import { download, type Download } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { MethodLink } from '#src/ui/method-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { saveAs } from '#src/ui/save-as.ts';
import { clipWords } from '#src/ui/words.ts';

/** The visit in open formats. */
export function TakeAway({ visitId, clips }: { visitId: string; clips: readonly Clip[] }) {
  const ready = clips.filter(({ state }) => state === 'ready');
  if (ready.length === 0) return null;
  const params = { id: visitId };
  return (
    <Section
      id="files"
      title="Take it away"
      margin={
        <>
          <p>
            The files hold no name of the athlete. They leave Redshank’s care: keep them where
            health data is kept.
          </p>
          <p>
            <MethodLink to="measures">How each value is computed</MethodLink>
          </p>
        </>
      }
    >
      <p className="max-w-lead">For a spreadsheet, a statistics package or another player.</p>
      <ul className="mt-3">
        <File
          label="Values and marks of every marked frame"
          format="CSV"
          fetch={() => download(routes.visitFrames, { params })}
        />
        <File
          label="Reps, marks and comments on the clips"
          format="Web Annotation, JSON-LD"
          fetch={() => download(routes.visitAnnotations, { params })}
        />
        {ready.map((clip) => (
          <File
            key={clip.id}
            label={`Comments on ${clipWords(clip)}`}
            format="WebVTT"
            fetch={() => download(routes.clipComments, { params: { id: clip.id } })}
          />
        ))}
      </ul>
    </Section>
  );
}

function File({
  label,
  format,
  fetch,
}: {
  label: string;
  format: string;
  fetch: () => Promise<Download>;
}) {
  const save = useMutation({
    mutationFn: fetch,
    onSuccess: ({ name, blob }) => saveAs(name, blob),
  });
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-6 border-b border-rule py-1 last:border-0">
      <span>
        {label} <span className="text-soft">({format})</span>
      </span>
      <Button
        look="plain"
        busy={save.isPending}
        onClick={() => save.mutate()}
        aria-label={`Save: ${label}`}
      >
        Save
      </Button>
      {save.isError && (
        <p role="alert" className="w-full text-note text-alarm">
          {save.error.message}
        </p>
      )}
    </li>
  );
}
