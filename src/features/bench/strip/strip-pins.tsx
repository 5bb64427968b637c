import type { Comment } from '#shared/contracts/comments.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { initials } from '#src/ui/initials.ts';
import { useBenchDocument, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import { pinRow, type StripLayout } from './strip-layout.ts';

/** Comments as pins above the hill, open ones in ochre; a press goes to the moment. */
export function StripPins({ layout }: { layout: StripLayout }) {
  const { store } = useBenchTools();
  const { comments } = useBenchDocument();
  const threads = comments.filter(
    ({ answerTo, fromFrame }) =>
      answerTo === null && layout.from <= fromFrame && fromFrame <= layout.to,
  );
  const pins = pinRow(threads, (comment) => comment.fromFrame, layout);
  const open = (comment: Comment) => {
    store.setState({ playing: false, desk: 'comments' });
    goTo(store, frameIndex(comment.fromFrame));
  };
  return (
    <ul aria-label="Comments on this clip">
      {pins.map(({ item, x, left, room }) => (
        <li key={item.id}>
          <span
            aria-hidden="true"
            className="pointer-events-none absolute top-6 w-px bg-edge"
            style={{ left: x, height: layout.base - 24 }}
          />
          <button
            type="button"
            onClick={() => open(item)}
            onPointerDown={(event) => event.stopPropagation()}
            aria-label={`${item.by.name} at frame ${item.fromFrame}${item.resolved ? ', resolved' : ''}: ${item.body}`}
            className={`absolute top-0 h-6 overflow-hidden text-ellipsis whitespace-nowrap rounded border px-1.5 text-left text-caption ${
              item.resolved ? 'border-edge bg-sheet' : 'border-ochre bg-ochre-pale'
            }`}
            style={{ left, maxWidth: room }}
          >
            <b>{initials(item.by.name)}</b>
            {room > 60 && ` ${item.body}`}
          </button>
        </li>
      ))}
    </ul>
  );
}
