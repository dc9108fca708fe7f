import { useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { definitions, type DefinitionTable } from '#shared/contracts/evidence.ts';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { queryKeys } from '#src/lib/query-keys.ts';
import type { EvidenceData } from './evidence-query.ts';
import { useEvidenceCall } from './use-evidence-call.ts';

type RowOf<T extends DefinitionTable> = BodyOf<(typeof definitions)[T]['create']>['row'];

/**
 * Makes, replaces and removes rows of one table of definitions. A replacement or removal carries the version of
 * the row that is on screen; 409 `changed-meanwhile` means that somebody changed it first.
 */
export function useDefinition<T extends DefinitionTable>(table: T) {
  const send = useEvidenceCall();
  const client = useQueryClient();
  const { address } = useProblem();
  return useMemo(() => {
    const endpoints = definitions[table];
    const versionOf = (id: string) =>
      client.getQueryData<EvidenceData>(queryKeys.evidence(address))?.rowVersions[id];
    return {
      create: (row: RowOf<T>) => send(endpoints.create, { body: { row } as never }),
      replace: (id: string, row: RowOf<T>) =>
        send(endpoints.replace, { params: { id }, body: { row } as never, ifMatch: versionOf(id) }),
      remove: (id: string) => send(endpoints.remove, { params: { id }, body: {}, ifMatch: versionOf(id) }),
    };
  }, [table, send, client, address]);
}
