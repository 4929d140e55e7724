'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { apiKey } from '@/app/_components/api/api-key';
import { callApi } from '@/app/_components/api/call-api';
import { problemOf } from '@/app/_components/api/problem-of';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { getStudyContract, updateGridContract, type Grid, type Study } from '@/lib/domain/studies/schema';
import type { UpdateGridInput } from '@/lib/domain/studies/input';

interface GridChange { grid: Grid; change: UpdateGridInput }

/** Changes grids one after the other, each under the revision that was read. */
export function useGridChange({ id }: Pick<Study, 'id'>, title: string) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const change = useMutation({
    mutationFn: async (changes: readonly GridChange[]) => {
      for (const { grid, change } of changes) {
        await callApi(updateGridContract, { organisation: slug, params: { id, label: grid.label }, revision: grid.revision, body: change });
      }
    },
    onSettled: () => queries.invalidateQueries({ queryKey: apiKey(getStudyContract) }),
  });
  return { change: change.mutateAsync, isChanging: change.isPending, problem: problemOf(change.error, title) };
}
