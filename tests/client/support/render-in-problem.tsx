import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { MemoryRouter } from 'react-router-dom';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { createFindingsStore, type FindingsStore } from '#src/lib/findings/findings-store.ts';
import { startEngine } from '#src/lib/findings/start-engine.ts';
import { ProblemContext, type OpenProblem } from '#src/lib/problem/problem-context.ts';
import { problem, team } from './invented.ts';

/** A findings store that has evaluated this evidence. */
export async function evaluated(evidence: Evidence): Promise<FindingsStore> {
  const store = createFindingsStore(startEngine);
  store.open();
  const done = new Promise<void>((resolve) => {
    const stop = store.subscribe(() => {
      stop();
      resolve();
    });
  });
  store.feed({ evidence, rowVersions: {}, steps: [] });
  await done;
  return store;
}

/** Shows a part of a station inside an open problem, with its findings. */
export function renderInProblem(part: ReactNode, store: FindingsStore, changes: Partial<OpenProblem> = {}) {
  const open: OpenProblem = {
    address: { team: 'tern-rock', number: 1 },
    team: team(),
    problem: problem(),
    role: 'member',
    mayWrite: true,
    me: 'Kasimir Lund',
    nextFight: null,
    store,
    ...changes,
  };
  const view = render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter>
        <ProblemContext value={open}>{part}</ProblemContext>
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return { ...view, user: userEvent.setup() };
}
