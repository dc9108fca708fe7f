import { useEffect } from 'react';
import { createStore } from './store/create-store.ts';

/** Words that a screen puts into the cup of its station in place of the usual count. */
export const stationCup = createStore<string | null>(null);

/** One count in words for the current station's cup: "2 not tied". */
export function useStationCup(words: string | null): void {
  useEffect(() => {
    stationCup.set(words);
    return () => stationCup.set(null);
  }, [words]);
}
