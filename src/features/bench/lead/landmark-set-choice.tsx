import { useId, useState } from 'react';
import { LANDMARK_SETS, type LandmarkSetId } from '#shared/landmarks/types.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { type Extra, EXTRAS, proposedSet } from '../model/led.ts';

const SET_WORDS: Readonly<Record<LandmarkSetId, string>> = {
  bare: 'Bare landmarks',
  belt: 'Belt pointer',
  'belt+thigh': 'Belt and thigh pointers',
};
const EXTRA_WORDS: Readonly<Record<Extra, string>> = {
  shoulders: 'both shoulders, for the side-bend of the trunk',
  foot: 'toe and heel, for the support foot',
};

/** Which landmarks marking leads through; the richest for which lengths are known is proposed. */
export function LandmarkSetChoice() {
  const { store } = useBenchTools();
  const { clip } = useBenchDocument();
  const { set, view } = useBenchModel();
  const { extras } = useBench((state) => state.taste);
  const [open, setOpen] = useState(false);
  const id = useId();
  if (view !== 'front') return null;
  const proposed = proposedSet(clip.geometry);
  const choose = (next: LandmarkSetId) =>
    store.setState((state) => ({
      taste: { ...state.taste, set: next === proposed ? null : next },
      chosen: null,
    }));
  const toggle = (extra: Extra) =>
    store.setState((state) => ({
      taste: {
        ...state.taste,
        extras: state.taste.extras.includes(extra)
          ? state.taste.extras.filter((each) => each !== extra)
          : [...state.taste.extras, extra],
      },
    }));
  return (
    <div className="text-note">
      <button
        type="button"
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        onClick={() => setOpen(!open)}
        className="min-h-[44px] text-left text-dusk-soft underline underline-offset-[3px]"
      >
        {SET_WORDS[set]}: {landmarksOf(set).length} landmarks
        {extras.length > 0 && ' and extras'}
      </button>
      {open && (
        <fieldset id={id} className="border-t border-dusk-rule pt-1">
          <legend className="sr-only">Landmarks to mark</legend>
          {LANDMARK_SETS.map((each) => (
            <label key={each} className="flex min-h-[44px] items-center gap-2">
              <input
                type="radio"
                name={id}
                checked={each === set}
                onChange={() => choose(each)}
                className="size-4 accent-dusk-ink"
              />
              <span>
                {SET_WORDS[each]}
                {each === proposed && <span className="text-dusk-soft">, proposed</span>}
              </span>
            </label>
          ))}
          {(Object.keys(EXTRAS) as Extra[]).map((extra) => (
            <label key={extra} className="flex min-h-[44px] items-center gap-2">
              <input
                type="checkbox"
                checked={extras.includes(extra)}
                onChange={() => toggle(extra)}
                className="size-4 accent-dusk-ink"
              />
              <span>{EXTRA_WORDS[extra]}</span>
            </label>
          ))}
        </fieldset>
      )}
    </div>
  );
}
