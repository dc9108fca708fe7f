import { createStore, type Store } from '#src/lib/store/create-store.ts';
import { keep, recall } from '#src/lib/preferences/preference.ts';

/** Which sections of a report are folded in this browser, by their names. */
export interface FoldedSections extends Pick<Store<ReadonlySet<string>>, 'get' | 'subscribe'> {
  setFolded(section: string, isFolded: boolean): void;
}

/** @param report - `tern-rock/1` */
export function foldedSections(report: string): FoldedSections {
  const name = `folded:${report}`;
  const kept = recall(name);
  const store = createStore<ReadonlySet<string>>(new Set(kept ? kept.split(',') : []));
  return {
    get: store.get,
    subscribe: store.subscribe,
    setFolded(section, isFolded) {
      if (store.get().has(section) === isFolded) return;
      const next = new Set(store.get());
      if (isFolded) next.add(section);
      else next.delete(section);
      keep(name, [...next].join(','));
      store.set(next);
    },
  };
}
