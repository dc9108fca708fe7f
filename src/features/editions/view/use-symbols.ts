import { useMemo } from 'react';
import { symbolToText } from '#shared/formatting/symbol.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';

/** The problem's symbols as sentences have them, so that a letter that is one is set as one. */
export function useSymbols(): readonly string[] {
  const { quantities } = useEvidence();
  return useMemo(() => quantities.map(({ symbol }) => symbolToText(symbol)), [quantities]);
}
