import { useSyncExternalStore } from 'react';
import type { Store } from './create-store.ts';

export function useStore<T>(store: Store<T>): T {
  return useSyncExternalStore(store.subscribe, store.get);
}
