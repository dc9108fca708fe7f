import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { namesOf, p, report, tex } from './report-writer.ts';

/** A first draft of the invented problem 4: what is seen, the law, and what was done. */
export function fallingCupsReport(evidence: Evidence): ReportDocument {
  const { table, equation } = namesOf(evidence);
  const [newest] = [...evidence.models].sort((a, b) => b.n - a.n);
  const output = evidence.quantities.find(({ id }) => id === newest?.output);
  const [first] = evidence.series;
  return report({
    Phenomenon: [
      p`Light paper cups, nested and dropped with their mouths up, soon fall at a steady speed. One cup floats down; eight together drop like a thing of weight. The cups keep their outline whatever their number, so only the weight changes, and the air answers with more resistance until the two agree.`,
      p`We read the task as asking for the steady speed, not for the time of the fall: what happens before the speed is steady is corrected for and shown, not hidden.`,
    ],
    Model: [
      p`At the steady speed the weight is balanced by a resistance that grows as the square of the speed, ${tex('m g = \\tfrac12 \\rho\\, C_\\mathrm{d} A\\, v_\\mathrm{t}^2')}, so the speed should grow as the square root of the mass:`,
      ...(newest && output ? [equation('eqspeed', newest.n, output.symbol, 'symbols')] : []),
    ],
    Experiment: [
      p`Each stack was weighed, then dropped six times past a window of known length and filmed. The frames between the two edges of the window give the speed.`,
      ...(first ? [table(first.letter, 'tablea', 'Every drop, by number of cups.')] : []),
    ],
    Comparison: [],
    Conclusion: [],
  });
}
