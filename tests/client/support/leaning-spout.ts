/** The invented Leaning Spout behind a fake server: real evidence, evaluated in the page. */
import type { Evidence, Trial } from '#shared/evidence/evidence.ts';
import type { Role } from '#shared/contracts/session.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { fakeServer, json, type FakeServer } from './fake-server.ts';
import { problem, session, summary, team, TODAY } from './invented.ts';

export const PROBLEM = '/team/tern-rock/problem/1';
export const API = '/api/teams/tern-rock/problems/1';

/** A screen's file is read when it is first opened, and the evidence evaluated. */
export const ENOUGH = { timeout: 15_000 };

export function spoutEvidence(changes: Partial<Evidence> = {}): Evidence {
  return { ...leaningSpoutEvidence(TODAY), ...changes };
}

/** Answers everything that a problem's screens ask for; trials that are sent are logged. */
export function spoutServer(evidence: Evidence = spoutEvidence(), role: Role = 'member'): FakeServer {
  const server = fakeServer();
  server.on('GET /api/session', session(role));
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
  server.on(`GET ${API}`, problem());
  server.on(`GET ${API}/evidence`, { evidence, rowVersions: {} });
  server.on(`POST ${API}/series/series-b/trials`, ({ body }) => {
    const { mutationId, trials } = body as { mutationId: string; trials: Pick<Trial, 'id' | 'values'>[] };
    const changes = trials.map(({ id, values }, index) => ({
      table: 'trials',
      id,
      row: {
        id,
        values,
        number: 20 + index,
        series: 'series-b',
        order: 100 + index,
        by: 'Ines Farrow',
        at: TODAY.toISOString(),
      },
    }));
    return json({ version: evidence.version + 1, mutationId, changes }, 201);
  });
  return server;
}
