import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { presentComment } from './comments.presenter.ts';
import { addComment, commentsOfClip, deleteComment, editComment } from './comments.service.ts';

export const commentsFeature: Feature = ({ serve }) => {
  serve(routes.listComments, async ({ params, work, actor }) => ({
    items: (await work((unit) => commentsOfClip(unit, params.id))).map((comment) =>
      presentComment(comment, actor.id),
    ),
  }));

  serve(routes.addComment, async ({ params, body, work, actor }) =>
    presentComment(await work((unit) => addComment(unit, params.id, body)), actor.id),
  );

  serve(routes.editComment, async ({ params, body, work, actor }) =>
    presentComment(await work((unit) => editComment(unit, params.id, body)), actor.id),
  );

  serve(routes.deleteComment, ({ params, work }) => work((unit) => deleteComment(unit, params.id)));
};
