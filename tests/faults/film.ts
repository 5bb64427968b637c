import assert from 'node:assert/strict';
import { product } from '#server/db/in-practice.ts';
import { KeptFilm } from '#server/features/replays/film/kept-film.entity.ts';
import { post } from './post.ts';
import { quiet } from './quiet.ts';
import { coveredClip } from './replay.ts';
import type { Task } from './task.ts';

/** The film that an athlete keeps is made of the copy with the hidden head. */
export const film: Task = {
  name: 'film to keep',
  within: 1500,
  prepare: async (place) => {
    const { newLink } = await coveredClip(place);
    const link = await newLink();
    await quiet(place);
    return {
      act: async () => {
        await post(place, `/api/replays/${link}/kept-film`, {});
      },
      kept: async () => {
        const made = await place.inPractice(product(place.practiceId), ({ em }) =>
          em.findOne(KeptFilm, { replay: link }),
        );
        assert.equal(made?.state, 'ready', 'a film that was asked for is there');
      },
    };
  },
};
