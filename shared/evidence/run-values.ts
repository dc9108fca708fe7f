import type { SourceFreedom } from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import type { Evaluation } from './evaluation.ts';
import { isFault } from './fault.ts';
import type { Finding, Group } from './findings.ts';
import { freedomOfGroupMean } from './group-freedom.ts';
import { seriesGroups } from './groups.ts';
import { registerFinding } from './register-finding.ts';
import { solvedValue } from './register-value.ts';
import { sourceFreedom, type EvaluatedFreedom } from './sources.ts';
import type { Values } from './values.ts';

/** Values as a running evaluation has them. */
export function runValues(run: Evaluation): Values {
  const findings = new Map<string | null, Map<string, Finding>>();
  const freedoms = new Map<string, SourceFreedom>();
  const values: Values = {
    register: run.register,
    finding: (quantity: string, series: string | null): Finding => {
      let inSeries = findings.get(series);
      if (inSeries === undefined) findings.set(series, (inSeries = new Map()));
      let found = inSeries.get(quantity);
      if (found === undefined)
        inSeries.set(quantity, (found = registerFinding(run, values, quantity, series)));
      return found;
    },
    groups: (series: string): readonly Group[] =>
      run.node(
        `group list@${series}`,
        () => [seriesGroups(run, series)],
        () => seriesGroups(run, series).map(({ group }) => group),
      ),
    freedomOf: (source: string): SourceFreedom => {
      let freedom = freedoms.get(source);
      if (freedom === undefined)
        freedoms.set(source, (freedom = sourceFreedom(run.register, source, freedomInRun(run, values))));
      return freedom;
    },
  };
  return values;
}

/** Degrees of freedom as a running evaluation knows them. */
export function freedomInRun(run: Evaluation, values: Values): EvaluatedFreedom {
  return {
    ofMean: (key) => {
      if (key.includes('@')) return freedomOfGroupMean(values, key);
      const quantity = run.register.quantities.get(key);
      const solved = quantity === undefined ? null : solvedValue(run, quantity);
      return solved === null || isFault(solved) ? Infinity : solved.degreesOfFreedom;
    },
    ofFit: (comparison) => run.solvers.fitFreedom(run, comparison),
  };
}
