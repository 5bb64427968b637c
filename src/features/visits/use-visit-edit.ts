import { useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod';
import { routes } from '#shared/contracts/routes.ts';
import type { Visit, visitEdit } from '#shared/contracts/visits.ts';
import { call } from '#src/api/client.ts';
import { isProblem } from '#src/api/problem.ts';
import { setUpsQuery, visitOptions } from '#src/api/visits.queries.ts';

type Edit = Omit<z.input<typeof visitEdit>, 'version'>;

/** Changes a visit. Where somebody else was faster, the newer version is fetched and the change is refused. */
export function useVisitEdit(visit: Visit) {
  const client = useQueryClient();
  const { queryKey } = visitOptions(visit.id);
  return useMutation({
    mutationFn: (edit: Edit) =>
      call(routes.editVisit, {
        params: { id: visit.id },
        body: { ...edit, version: visit.version },
      }),
    onSuccess: (saved, edit) => {
      client.setQueryData(queryKey, (page) => page && { ...page, visit: saved });
      if (edit.setUpId !== undefined)
        void client.invalidateQueries({ queryKey: setUpsQuery.queryKey });
    },
    onError: (error) => {
      if (isProblem(error, 'edited-meanwhile'))
        void client.invalidateQueries({ queryKey, exact: true });
    },
  });
}
