import type { SourceFreedom } from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import type { Evidence } from './evidence.ts';
import { fault } from './fault.ts';
import type { Finding, Findings, Group } from './findings.ts';
import { freedomOfGroupMean } from './group-freedom.ts';
import { quantityKey } from './keys.ts';
import { registerOf, seriesName, symbolName } from './register.ts';
import { sourceFreedom, type EvaluatedFreedom } from './sources.ts';
import type { Values } from './values.ts';

const known = new WeakMap<Findings, { readonly evidence: Evidence; readonly values: Values }>();
const NO_GROUPS: readonly Group[] = [];

/** Values as findings have them, once an evaluation is done. */
export function findingsValues(findings: Findings, evidence: Evidence): Values {
  const before = known.get(findings);
  if (before !== undefined && before.evidence === evidence) return before.values;
  const register = registerOf(evidence);
  const evaluated: EvaluatedFreedom = {
    ofMean: (key) =>
      key.includes('@')
        ? freedomOfGroupMean(values, key)
        : (findings.sources.get(`mean:${key}`)?.degreesOfFreedom ?? Infinity),
    ofFit: (comparison) => findings.sources.get(`fit:${comparison}:0`)?.degreesOfFreedom ?? Infinity,
  };
  const values: Values = {
    register,
    finding: (quantity: string, series: string | null): Finding => {
      const inSeries = series === null ? undefined : findings.values.get(quantityKey(quantity, series));
      const found = inSeries ?? findings.values.get(quantity);
      if (found === undefined) return fault('source gone', 'The quantity is gone. Choose another.', quantity);
      if (
        series === null ||
        inSeries !== undefined ||
        found.shape !== 'fault' ||
        found.code !== 'no single value'
      )
        return found;
      const name = seriesName(register, series);
      return fault(
        'missing input',
        `${symbolName(register, quantity)} is neither read nor held in ${name}.`,
        series,
      );
    },
    groups: (series: string): readonly Group[] => findings.groups.get(series) ?? NO_GROUPS,
    freedomOf: (source: string): SourceFreedom => sourceFreedom(register, source, evaluated),
  };
  known.set(findings, { evidence, values });
  return values;
}
