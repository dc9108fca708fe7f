import { expect, test, vi } from 'vitest';
import type { Quantity, ValueReference } from '#shared/evidence/evidence.ts';
import type { EvidenceData } from '#src/lib/evidence/evidence-query.ts';
import { createFindingsEngine } from '#src/lib/findings/findings-engine.ts';
import { createFindingsStore } from '#src/lib/findings/findings-store.ts';
import { emptyEvidence } from '../support/invented.ts';

function constant(id: string, symbol: string, text: string): Quantity {
  return {
    id,
    symbol,
    name: symbol,
    unit: 'cm',
    status: 'measured',
    def: { origin: 'constant', reading: { text, unit: 'cm', u: '0.1' }, parts: [] },
  };
}

const HEAD: ValueReference = { kind: 'quantity', quantity: 'q-h' };
const HEIGHT: ValueReference = { kind: 'quantity', quantity: 'q-y' };

function first(): EvidenceData {
  return {
    evidence: emptyEvidence({
      version: 1,
      quantities: [constant('q-h', 'h', '20.0'), constant('q-y', 'y', '12.0')],
    }),
    rowVersions: {},
    steps: [],
  };
}

function withHead(before: EvidenceData, version: number, text: string): EvidenceData {
  const row = constant('q-h', 'h', text);
  const quantities = before.evidence.quantities.map((quantity) => (quantity.id === 'q-h' ? row : quantity));
  return {
    ...before,
    evidence: { ...before.evidence, version, quantities },
    steps: [
      ...before.steps,
      { version, mutationId: `m-${version}`, changes: [{ table: 'quantities', id: 'q-h', row }] },
    ],
  };
}

function openStore() {
  const store = createFindingsStore(() =>
    Promise.resolve({ engine: createFindingsEngine(), stop: () => undefined }),
  );
  store.open();
  return store;
}

test('findings store, when a value changes: only those who watch that value hear of it', async () => {
  const store = openStore();
  const one = first();
  store.feed(one);
  await vi.waitFor(() => expect(store.get()?.findings.version).toBe(1));
  const headHeard = vi.fn();
  const heightHeard = vi.fn();
  store.subscribeTo(HEAD, headHeard);
  store.subscribeTo(HEIGHT, heightHeard);

  store.feed(withHead(one, 2, '19.5'));
  await vi.waitFor(() => expect(store.get()?.findings.version).toBe(2));

  expect(headHeard).toHaveBeenCalledTimes(1);
  expect(headHeard.mock.calls[0]?.[0]).toMatchObject({ shape: 'scalar', value: 0.195 });
  expect(heightHeard).not.toHaveBeenCalled();
});

test('findings store, at any moment: evidence and findings are of one version', async () => {
  const store = openStore();
  const seen: (readonly [number, number])[] = [];
  store.subscribe(() => {
    const snapshot = store.get();
    if (snapshot) seen.push([snapshot.evidence.version, snapshot.findings.version]);
  });
  const one = first();
  const two = withHead(one, 2, '19.5');

  store.feed(one);
  store.feed(two);
  store.feed(withHead(two, 3, '19.0'));
  await vi.waitFor(() => expect(store.get()?.findings.version).toBe(3));

  expect(seen.length).toBeGreaterThan(0);
  expect(seen.filter(([evidence, findings]) => evidence !== findings)).toEqual([]);
});

test('findings store, when nobody watches any more: is quiet', async () => {
  const store = openStore();
  const one = first();
  store.feed(one);
  await vi.waitFor(() => expect(store.get()).not.toBeNull());
  const heard = vi.fn();
  const stop = store.subscribeTo(HEAD, heard);

  stop();
  store.feed(withHead(one, 2, '19.5'));
  await vi.waitFor(() => expect(store.get()?.findings.version).toBe(2));

  expect(heard).not.toHaveBeenCalled();
});

test('findings store, when it was closed and opened again: goes on with the newest evidence', async () => {
  const store = openStore();
  const one = first();
  store.feed(one);
  store.close();
  store.open();

  store.feed(withHead(one, 2, '19.5'));
  await vi.waitFor(() => expect(store.get()?.findings.version).toBe(2));

  expect(store.find(HEAD)).toMatchObject({ shape: 'scalar', value: 0.195 });
});
