import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { namesOf, p, report, tex } from './report-writer.ts';

/** A first draft of the invented problem 6. */
export function brakedMagnetReport(evidence: Evidence): ReportDocument {
  const { table } = namesOf(evidence);
  const [first] = evidence.series;
  return report({
    Phenomenon: [
      p`A strong cylinder magnet dropped into a copper pipe does not fall but sinks, at a speed that is steady almost from the start. Copper is no magnet; what holds the falling one back is the current that its own motion drives round the wall of the pipe.`,
    ],
    Model: [
      p`The moving dipole drives a ring current in every slice of the wall. The power that these currents turn into heat must be what the weight gives, so the brake is proportional to the speed, ${tex('F = k v')}, and the steady speed is ${tex('v_\\mathrm{t} = m g / k')}.`,
    ],
    Experiment: [
      p`Two coils round the pipe give a pulse each as the magnet passes; brass slugs raise the mass without changing the magnet. Six drops were made with every mass.`,
      ...(first ? [table(first.letter, 'tablea', 'Every drop, by mass.')] : []),
    ],
    Comparison: [],
    Conclusion: [],
  });
}
