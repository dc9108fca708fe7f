import type { ProblemSummary } from '#shared/contracts/teams.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings, Verdict } from '#shared/evidence/findings.ts';
import { sectionLevels } from '#shared/report/levels.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';

/** How far a problem has come, as the season tells it: nothing here is set by hand. */
export function summariseProblem(
  document: ReportDocument,
  evidence: Evidence,
  findings: Findings,
): Pick<ProblemSummary, 'levels' | 'claims' | 'trials' | 'notTied'> {
  const sections = sectionLevels(document, evidence, findings);
  const verdicts = [...findings.claims.values()].map(({ verdict }) => verdict);
  const count = (wanted: Verdict) => verdicts.filter((verdict) => verdict === wanted).length;
  return {
    levels: sections.map(({ section, level }) => ({ section, level })),
    claims: { holds: count('Holds'), leaks: count('Leaks'), undecided: count('Undecided') },
    trials: evidence.trials.filter(({ withdrawn }) => !withdrawn).length,
    notTied: sections.reduce((sum, { notTied }) => sum + notTied, 0),
  };
}
