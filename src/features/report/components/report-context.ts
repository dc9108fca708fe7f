import { createContext, useContext } from 'react';
import type { ValueReference } from '#shared/evidence/evidence.ts';
import type { BlockNumbers } from '#shared/report/block-numbers.ts';

/** What the parts of a report share: their numbers, and how a number's provenance is opened in the margin. */
export interface ReportParts {
  readonly numbers: BlockNumbers;
  readonly openReference: (reference: ValueReference, element: HTMLElement, byKey: boolean) => void;
}

const none: ReadonlyMap<string, number> = new Map();

export const ReportPartsContext = createContext<ReportParts>({
  numbers: { figures: none, plates: none, tables: none, formulas: none },
  openReference: () => undefined,
});

export function useReportParts(): ReportParts {
  return useContext(ReportPartsContext);
}

export function useNumbers(): BlockNumbers {
  return useReportParts().numbers;
}
