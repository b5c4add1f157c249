import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';

import {
  archiveVessel,
  createVessel,
  deleteVessel,
  duplicateVessel,
  getVessel,
  importVessel,
  listVessels,
  renameVessel,
  restoreVessel,
  unarchiveVessel,
  type NewVessel,
  type VesselSummary,
} from '#shared/api/vessels.ts';
import { call } from '#src/lib/call.ts';

export type VesselListState = VesselSummary['state'];

/** All vessels of a state: the pages of the list one after another. */
export function vesselsQuery(state: VesselListState) {
  return queryOptions({
    queryKey: ['vessels', 'list', state],
    queryFn: async ({ signal }) => {
      const rows: VesselSummary[] = [];
      let after: string | undefined;
      do {
        const page = await call(listVessels, { query: { state, limit: 200, after }, signal });
        rows.push(...page.rows);
        after = page.next ?? undefined;
      } while (after !== undefined);
      return rows;
    },
  });
}

export function vesselQuery(vesselId: string) {
  return queryOptions({
    queryKey: ['vessels', vesselId, 'summary'],
    queryFn: ({ signal }) => call(getVessel, { params: { vesselId }, signal }),
    staleTime: 60_000,
  });
}

export function useCreateVessel() {
  return useVesselMutation((body: z.input<typeof NewVessel>) => call(createVessel, { body }));
}

export function useImportVessel() {
  return useVesselMutation((body: { shopId: string; file: string }) => call(importVessel, { body }));
}

export function useRenameVessel(vesselId: string) {
  return useVesselMutation((name: string) => call(renameVessel, { params: { vesselId }, body: { name } }));
}

export function useDuplicateVessel(vesselId: string) {
  return useVesselMutation<void>(() => call(duplicateVessel, { params: { vesselId } }));
}

const MOVES = {
  archive: archiveVessel,
  unarchive: unarchiveVessel,
  delete: deleteVessel,
  restore: restoreVessel,
} as const;
export type VesselMove = keyof typeof MOVES;

/** Putting a vessel away and bringing it back; each has its opposite, so none asks first. */
export function useMoveVessel() {
  return useVesselMutation(({ vesselId, move }: { vesselId: string; move: VesselMove }) =>
    call(MOVES[move], { params: { vesselId } }),
  );
}

function useVesselMutation<Input>(send: (input: Input) => Promise<VesselSummary>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: send,
    onSuccess: (vessel) => keepVessel(client, vessel),
  });
}

function keepVessel(client: QueryClient, vessel: VesselSummary): Promise<void> {
  client.setQueryData(vesselQuery(vessel.vesselId).queryKey, vessel);
  return client.invalidateQueries({ queryKey: ['vessels', 'list'] });
}
