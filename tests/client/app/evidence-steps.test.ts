import { QueryClient } from '@tanstack/react-query';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import type { Instrument } from '#shared/evidence/evidence.ts';
import { evidenceQuery, takeStep, type EvidenceData } from '#src/lib/evidence/evidence-query.ts';
import { fakeServer, json, type FakeServer } from '../support/fake-server.ts';
import { emptyEvidence } from '../support/invented.ts';

const ADDRESS = { team: 'tern-rock', number: 1 };
const PLACE = 'GET /api/teams/tern-rock/problems/1/evidence';
const RULE: Instrument = { id: 'i-rule', name: 'Steel rule', parts: [] };

let server: FakeServer;
let client: QueryClient;

beforeEach(() => {
  server = fakeServer();
  client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
});

afterEach(() => {
  client.clear();
  vi.unstubAllGlobals();
});

function step(version: number, name: string): EvidenceStep {
  return {
    version,
    mutationId: `m-${version}`,
    changes: [{ table: 'instruments', id: 'i-rule', row: { ...RULE, name } }],
  };
}

async function load(version: number): Promise<EvidenceData> {
  server.on(PLACE, () =>
    json({ evidence: emptyEvidence({ version, instruments: [RULE] }), rowVersions: { 'i-rule': 4 } }),
  );
  return client.query(evidenceQuery(client, ADDRESS));
}

function cached(): EvidenceData | undefined {
  return client.getQueryData(evidenceQuery(client, ADDRESS).queryKey);
}

test('take step, when it is the next one: the row, its version and the step are there', async () => {
  await load(7);

  expect(takeStep(client, ADDRESS, step(8, 'Wooden rule'))).toBe('applied');

  expect(cached()?.evidence.version).toBe(8);
  expect(cached()?.evidence.instruments[0]?.name).toBe('Wooden rule');
  expect(cached()?.rowVersions).toEqual({ 'i-rule': 5 });
  expect(cached()?.steps.map(({ version }) => version)).toEqual([8]);
});

test('take step, when it comes a second time as our own echo: changes nothing', async () => {
  await load(7);
  takeStep(client, ADDRESS, step(8, 'Wooden rule'));
  const before = cached();

  expect(takeStep(client, ADDRESS, step(8, 'Wooden rule'))).toBe('old');

  expect(cached()).toBe(before);
});

test('take step, when steps are missing before it: the evidence is asked for again', async () => {
  await load(7);
  const observed = client.getQueryCache().find({ queryKey: evidenceQuery(client, ADDRESS).queryKey });

  expect(takeStep(client, ADDRESS, step(9, 'Wooden rule'))).toBe('gap');

  expect(cached()?.evidence.version).toBe(7);
  expect(observed?.state.isInvalidated).toBe(true);
});

test('take step, when the problem is not open: does nothing', () => {
  expect(takeStep(client, ADDRESS, step(8, 'Wooden rule'))).toBe('not open');
});

test('fetch of evidence, when a step arrived while it was on its way: what is newer stays', async () => {
  await load(7);
  takeStep(client, ADDRESS, step(8, 'Wooden rule'));
  server.on(PLACE, () => json({ evidence: emptyEvidence({ version: 7 }), rowVersions: {} }));

  await client.query({ ...evidenceQuery(client, ADDRESS), staleTime: 0 });

  expect(cached()?.evidence.version).toBe(8);
});
