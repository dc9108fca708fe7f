import type { NewTrial } from '#shared/contracts/evidence.ts';
import { createStore, type Store } from '#src/lib/store/create-store.ts';

/** A trial that was logged here and has not reached the server yet. Its id makes sending it twice harmless. */
export interface WaitingTrial {
  readonly series: string;
  readonly trial: NewTrial;
}

export interface Outbox extends Store<readonly WaitingTrial[]> {
  add(waiting: WaitingTrial): void;
  remove(id: string): void;
}

/** What waits to be sent for one problem, kept in the browser so that closing the page loses nothing. */
export function createOutbox(key: string, storage: Pick<Storage, 'getItem' | 'setItem'>): Outbox {
  const store = createStore<readonly WaitingTrial[]>(read(storage.getItem(key)));
  const keep = (next: readonly WaitingTrial[]) => {
    storage.setItem(key, JSON.stringify(next));
    store.set(next);
  };
  return {
    ...store,
    set: keep,
    add: (waiting) => keep([...store.get().filter(({ trial }) => trial.id !== waiting.trial.id), waiting]),
    remove: (id) => keep(store.get().filter(({ trial }) => trial.id !== id)),
  };
}

function read(kept: string | null): readonly WaitingTrial[] {
  if (kept === null) return [];
  try {
    const parsed: unknown = JSON.parse(kept);
    return Array.isArray(parsed) ? (parsed as WaitingTrial[]) : [];
  } catch {
    return [];
  }
}
