import type { Evidence } from './evidence.ts';
import { findingsValues } from './findings-values.ts';
import type { Findings, Source } from './findings.ts';
import { describeSource } from './sources.ts';

/**
 * Any source that a value names, in words: those of the register as the findings have them, and those of means,
 * single readings and settings, which are made with the values that name them.
 *
 * @param id - a part's source: `inst:…`, `const:…`, `held:…`, `fit:…`, `mean:…`, `trial:…` or `set:…`
 */
export function findSource(findings: Findings, evidence: Evidence, id: string): Source {
  const known = findings.sources.get(id);
  if (known !== undefined) return known;
  const values = findingsValues(findings, evidence);
  const { degreesOfFreedom } = values.freedomOf(id);
  return describeSource(values.register, id, {
    ofMean: () => degreesOfFreedom,
    ofFit: () => degreesOfFreedom,
  });
}
