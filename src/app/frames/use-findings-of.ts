import { useEffect, useState } from 'react';
import type { EvidenceData } from '#src/lib/evidence/evidence-query.ts';
import { createFindingsStore, type FindingsStore } from '#src/lib/findings/findings-store.ts';
import { startEngine } from '#src/lib/findings/start-engine.ts';

/** Findings that follow this evidence for as long as the frame stands. */
export function useFindingsOf(data: EvidenceData | undefined): FindingsStore {
  const [store] = useState(() => createFindingsStore(startEngine));
  useEffect(() => {
    store.open();
    return () => store.close();
  }, [store]);
  useEffect(() => {
    if (data) store.feed(data);
  }, [store, data]);
  return store;
}
