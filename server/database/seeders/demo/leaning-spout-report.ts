import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { bullets, heading, italic, live, namesOf, p, report, tex } from './report-writer.ts';

/**
 * The invented report of problem 1, bound to its evidence. Two numbers in the Comparison are typed and not tied, as
 * they are in a report the week before.
 */
export function leaningSpoutReport(evidence: Evidence): ReportDocument {
  const { q, series, model, comparison, settingOf, claim, chart, table, equation } = namesOf(evidence);
  const b = series('B');
  const at38 = settingOf('B10');
  const at55 = settingOf('B17');
  const R = q('R');
  const newest = model(3);
  const mean38 = { kind: 'mean', quantity: R, ...at38 } as const;
  const predicted38 = { kind: 'prediction', model: newest, quantity: R, ...at38 } as const;
  const mean55 = { kind: 'mean', quantity: R, ...at55 } as const;
  const predicted55 = { kind: 'prediction', model: newest, quantity: R, ...at55 } as const;
  const held = (symbol: string) =>
    live({ kind: 'quantity', quantity: q(symbol), series: b }, 'symbol and value');
  const known = (symbol: string) => live({ kind: 'quantity', quantity: q(symbol) }, 'symbol and value');
  const upright = comparison(/upright|series A/i);
  const fit = (figure: 'chi-squared' | 'degrees of freedom' | 'p-value') =>
    live({ kind: 'fit', comparison: upright, figure });

  return report({
    Phenomenon: [
      p`A tall can with a small hole low in its side is filled with water and leaned back on a wedge. Upright, the jet leaves level and lands close to the can. Leaned, it leaves upwards and lands farther away; leaned too far, it climbs and falls short again. Somewhere between the two it reaches furthest.`,
      p`By the greatest reach we mean the largest distance ${tex('R')} on the tray, measured from the point below the spout, while the head above the spout is kept at ${held('h')}. Holes of other shapes, and the moment when the can runs dry, are not asked about and not answered here.`,
      p`What strikes one first is that the reach follows the water level and nothing else: topping the can up brings the landing point back to where it was. These quantities matter:`,
      bullets(
        p`the head ${tex('h')} of the water above the spout,`,
        p`the lean ${tex('\\theta')} of the can, which turns the jet upwards,`,
        p`the height ${tex('y')} of the spout above the tray.`,
      ),
    ],
    Model: [
      p`Energy along a streamline gives the jet its speed, ${tex('v = C_\\mathrm{v}\\sqrt{2gh}')}, where the speed coefficient ${tex('C_\\mathrm{v}')} stands for what is lost at the edge of the hole. It is handy to call ${tex('H = C_\\mathrm{v}^2 h')} the effective head. A free flight from the spout at height ${known('y')} then gives the range:`,
      equation('eqrange', 3, 'R', 'symbols'),
      p`The first term is the range back to the level of the spout; the second is what the jet gains while it falls the height ${tex('y')}. The range is greatest where ${tex('\\tan\\theta^* = \\sqrt{H/(H+y)}')}; there`,
      equation('eqrmax', 3, 'R_max', 'numbers and result', { series: b }),
      p`with ${held('h')} and ${known('C_v')}, the latter fitted to the upright can alone. The model therefore has ${italic('no free parameter left')} when the can is leaned. Without the drop (${tex('y = 0')}) the best lean would be 45°, as for any throw over level ground; with it the can must be leaned less.`,
      p`We trust the model while the head is 4 to 20 cm and the lean 0 to 60°. Below 4 cm the jet clings to the wall. Drag, surface tension and swirl are left out.`,
    ],
    Experiment: [
      p`The can stands on a wedge that is clamped to the bench. Lean is read on a protractor, head on a steel rule fixed inside the can, and range on a ruled tray that is kept level. Every reading has its own uncertainty; the zero of the tray is common to all of them, so it never averages away.`,
      p`Series A holds the can upright and lets it drain. It serves to find ${tex('C_\\mathrm{v}')} and nothing else. Series B keeps the head at ${held('h')} and varies the lean; each lean was set anew for every trial. Together they are ${live({ kind: 'count', of: 'trials' })}, of which ${live({ kind: 'count', of: 'excluded' })} is excluded: in B11 the can slid back and the range was read from the old mark. It stays in the table and in the chart, hollow.`,
      table(
        'B',
        'tableb',
        'Series B, the lean varied at one head. Means at each lean; B11, excluded, is struck.',
      ),
      p`Water was kept away from the laptop and the floor was mopped between trials; the rules of our laboratory decide what else is needed.`,
    ],
    Comparison: [
      p`With ${tex('C_\\mathrm{v}')} alone free, the upright can gives ${known('C_v')}; ${tex('\\chi^2')} is ${fit('chi-squared')} for ${fit('degrees of freedom')} degrees of freedom (${tex('p')} = ${fit('p-value')}). The square root of the head is all that series A asks for.`,
      claim(1, 'claimone'),
      p`Leaned, the model is tested and not fitted. Up to 30° the means lie within 2${italic('u')} of the curve. At 38° we find ${live(mean38)} where ${live(predicted38)} is predicted: the jet lands ${live({ kind: 'difference', a: predicted38, b: mean38 })} short, and the gap widens with lean, to ${live({ kind: 'difference', a: predicted55, b: mean55 })} at 55°. We put this down to drag on the broken jet, which the model leaves out: to the eye it breaks after about 25 cm of flight, into drops of some 3 mm.`,
      chart(
        1,
        'figrange',
        'Range against lean at one head. Means of two to three trials; B11, excluded, is hollow.',
      ),
      claim(2, 'claimtwo'),
      claim(3, 'claimthree'),
      heading('Could a wrong coefficient be the reason?'),
      p`A smaller ${tex('C_\\mathrm{v}')} would lower the whole curve and close the gap at every lean, but the upright can does not allow it: there the same coefficient fits ten trials as well as their uncertainties demand. A term that grows with the length of flight is what is missing.`,
    ],
    Conclusion: [
      p`How far can the jet reach? The model foretells ${live({ kind: 'quantity', quantity: q('R_max'), series: b })} at a lean of ${live({ kind: 'quantity', quantity: q('θ_m'), series: b })}; at 38° we measure ${live(mean38)}. The prediction stands up to 30° and is too long beyond, because the jet breaks and the drops feel the air.`,
      claim(4, 'claimfour'),
      p`What comes next: film the jet to see where it breaks, lean the can at two more heads, and measure the surface tension that we have only named so far. What would prove us wrong is a jet that stays whole and still lands short.`,
    ],
  });
}
