/** The leaning spout as it stood when its two editions were frozen: fewer trials, fewer models, an earlier text. */
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { findSection, type SectionName } from '#shared/report/schema/section-type.ts';
import type { BlockNode } from '#shared/report/schema/report-node.ts';
import { momentBefore } from './demo-clock.ts';
import { leaningSpoutEvidence } from './leaning-spout-evidence.ts';
import { leaningSpoutReport } from './leaning-spout-report.ts';
import { italic, live, namesOf, p, report, tex } from './report-writer.ts';

/** An edition of the invented past. */
export interface DemoEdition {
  readonly at: string;
  /** Id of who froze it. */
  readonly by: string;
  readonly note: string;
  readonly evidence: Evidence;
  readonly document: ReportDocument;
}

/** The first is of the upright can alone, the second of the first twelve leaned trials too. */
export function leaningSpoutEditions(firstStart: Date): readonly DemoEdition[] {
  const first = { at: momentBefore(firstStart, 16, '21:15'), by: 'demo-ines' };
  const second = { at: momentBefore(firstStart, 4, '17:40'), by: 'demo-ines' };
  const upright = uprightEvidence(firstStart, first.at);
  const leaned = trialsUntil(leaningSpoutEvidence(firstStart), second.at);
  return [
    {
      ...first,
      note: 'The upright can, for the first evening with Odile.',
      evidence: upright,
      document: uprightReport(upright),
    },
    {
      ...second,
      note: 'The first leaned trials. At 38° a third one is missing.',
      evidence: leaned,
      document: leanedReport(firstStart),
    },
  ];
}

function trialsUntil(evidence: Evidence, at: string): Evidence {
  return { ...evidence, trials: evidence.trials.filter((trial) => trial.at < at) };
}

/** Before the can was ever leaned: models 1 and 2, and one claim that can be tested. */
function uprightEvidence(firstStart: Date, at: string): Evidence {
  const now = trialsUntil(leaningSpoutEvidence(firstStart), at);
  const laterQuantities = new Set(['q-rmax', 'q-best']);
  return {
    ...now,
    quantities: now.quantities
      .filter(({ id }) => !laterQuantities.has(id))
      .map((row) => (row.id === 'q-head' ? { ...row, def: { origin: 'predicted', model: 'model-2' } } : row)),
    series: now.series.filter(({ id }) => id === 'series-a'),
    models: now.models.filter((model) => model.at < at),
    comparisons: now.comparisons
      .filter(({ id }) => id === 'c-upright' || id === 'c-plain')
      .map((row) => (row.id === 'c-upright' ? { ...row, model: 'model-2' } : row)),
    claims: now.claims.map((claim) => {
      if (claim.id === 'claim-1' || claim.id === 'claim-4') return claim;
      const open = { ...claim, test: null, openBecause: 'the can has only stood upright so far' };
      return claim.id === 'claim-3'
        ? { ...open, text: 'A leaned can reaches further than an upright one.' }
        : open;
    }),
    charts: now.charts.filter(({ id }) => id === 'chart-upright'),
  };
}

function uprightReport(evidence: Evidence): ReportDocument {
  const { q, series, model, comparison, claim, chart, table, equation } = namesOf(evidence);
  const known = (symbol: string) => live({ kind: 'quantity', quantity: q(symbol) }, 'symbol and value');
  const upright = comparison(/upright can$/i);
  const fit = (figure: 'chi-squared' | 'degrees of freedom') =>
    live({ kind: 'fit', comparison: upright, figure });
  return report({
    Phenomenon: [
      p`A tall can with a small hole low in its side is filled with water. The jet leaves level and lands close to the can. What strikes one first is that the reach follows the water level and nothing else: topping the can up brings the landing point back to where it was.`,
    ],
    Model: [
      p`Energy along a streamline gives the jet its speed, ${tex('v = C_\\mathrm{v}\\sqrt{2gh}')}, where the speed coefficient ${tex('C_\\mathrm{v}')} stands for what is lost at the edge of the hole. A free fall from the spout at height ${known('y')} then gives the range:`,
      equation('equpright', 2, 'R', 'symbols'),
      p`We trust the model while the head is 4 to 20 cm. Below 4 cm the jet clings to the wall.`,
    ],
    Experiment: [
      p`The can stands on the bench and drains. Head is read on a steel rule fixed inside the can, and range on a ruled tray that is kept level. There are ${live({ kind: 'count', of: 'trials', series: series('A') })}.`,
      table('A', 'tablea', 'Series A, the upright can draining.'),
    ],
    Comparison: [
      p`With ${tex('C_\\mathrm{v}')} alone free, the upright can gives ${known('C_v')}; ${tex('\\chi^2')} is ${fit('chi-squared')} for ${fit('degrees of freedom')} degrees of freedom.`,
      claim(1, 'claimone'),
      chart(2, 'figupright', 'Range against head, the can upright.'),
    ],
    Conclusion: [
      p`The square root of the head is all that series A asks for, and model ${String(evidence.models.find(({ id }) => id === model(2))?.n ?? 2)} has it. How far a ${italic('leaned')} can reaches is still to be measured.`,
      claim(3, 'claimthree'),
    ],
  });
}

/** The text of today, but for what could not be said before the can was leaned further than 38°. */
function leanedReport(firstStart: Date): ReportDocument {
  const evidence = leaningSpoutEvidence(firstStart);
  const { q, series, model, comparison, settingOf, claim, chart } = namesOf(evidence);
  const b = series('B');
  const at38 = settingOf('B10');
  const mean = { kind: 'mean', quantity: q('R'), ...at38 } as const;
  const predicted = { kind: 'prediction', model: model(3), quantity: q('R'), ...at38 } as const;
  const known = (symbol: string) => live({ kind: 'quantity', quantity: q(symbol) }, 'symbol and value');
  const upright = comparison(/upright can$/i);
  const fit = (figure: 'chi-squared' | 'degrees of freedom' | 'p-value') =>
    live({ kind: 'fit', comparison: upright, figure });
  return withSections(leaningSpoutReport(evidence), {
    Comparison: [
      p`With ${tex('C_\\mathrm{v}')} alone free, the upright can gives ${known('C_v')}; ${tex('\\chi^2')} is ${fit('chi-squared')} for ${fit('degrees of freedom')} degrees of freedom (${tex('p')} = ${fit('p-value')}). The square root of the head is all that series A asks for.`,
      claim(1, 'claimone'),
      p`Leaned, the model is tested and not fitted. Up to 30° the means lie within 2${italic('u')} of the curve. At 38° we find ${live(mean)} where ${live(predicted)} is predicted: the jet lands ${live({ kind: 'difference', a: predicted, b: mean })} short. Two trials are too few to say whether that means anything.`,
      chart(
        1,
        'figrange',
        'Range against lean at one head. Means of two to three trials; B11, excluded, is hollow.',
      ),
      claim(2, 'claimtwo'),
      claim(3, 'claimthree'),
    ],
    Conclusion: [
      p`How far can the jet reach? The model foretells ${live({ kind: 'quantity', quantity: q('R_max'), series: b })} at a lean of ${live({ kind: 'quantity', quantity: q('θ_m'), series: b })}; at 38° we measure ${live(mean)}. The prediction stands up to 30°.`,
      claim(4, 'claimfour'),
      p`What comes next: a third trial at 38°, and leans of 45° and more.`,
    ],
  });
}

function withSections(
  document: ReportDocument,
  sections: Partial<Record<SectionName, readonly BlockNode[]>>,
): ReportDocument {
  return {
    ...document,
    content: document.content.map((section) => {
      const name = findSection(section.type)?.name;
      const content = name === undefined ? undefined : sections[name];
      return content === undefined ? section : { ...section, content };
    }),
  };
}
