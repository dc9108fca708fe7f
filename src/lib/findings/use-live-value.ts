import { useCallback, useRef, useSyncExternalStore } from 'react';
import type { ValueReference } from '#shared/evidence/evidence.ts';
import type { Fault, Scalar } from '#shared/evidence/findings.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { sameValue } from './same-value.ts';

/** One reference's value; renders again only when that value has become another one. */
export function useLiveValue(reference: ValueReference): Scalar | Fault | null {
  const { store } = useProblem();
  const key = JSON.stringify(reference);
  const held = useRef<{ key: string; value: Scalar | Fault | null } | null>(null);
  const subscribe = useCallback(
    (listener: () => void) => store.subscribeTo(JSON.parse(key) as ValueReference, listener),
    [store, key],
  );
  return useSyncExternalStore(subscribe, () => {
    const value = store.find(JSON.parse(key) as ValueReference);
    if (held.current?.key !== key || !sameValue(held.current.value, value)) held.current = { key, value };
    return held.current.value;
  });
}
