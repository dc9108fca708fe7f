import { formatScalar, formatValue } from '#shared/formatting/format-scalar.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import type { SolvedContext } from './comparison-warnings.ts';
import type { ComparisonFinding, ComparisonPoint } from './findings.ts';
import { settingsInWords } from './group-mean.ts';
import { modelName, seriesName, symbolName, type Register } from './register.ts';
import { counted, countInWords, figureInWords, listInWords, startSentence } from './words.ts';

type Figures = Pick<ComparisonFinding, 'chiSquared' | 'degreesOfFreedom' | 'points' | 'used' | 'outside'>;

/** A comparison told in one sentence: what a fit gave, or how many settings agree and where it misses most. */
export function comparisonSentence(context: SolvedContext, figures: Figures): string {
  return context.fit === null ? predictionSentence(context, figures) : fitSentence(context, figures);
}

function fitSentence({ register, comparison, data, fit }: SolvedContext, figures: Figures): string {
  const symbols = data.free.map(({ quantity }) => symbolName(register, quantity));
  const values = (fit?.parameters ?? []).map(({ quantity, value, fitParts, sharedParts }) => {
    const shown = { value, u: standardUncertainty([...fitParts, ...sharedParts]) };
    const unit = register.quantities.get(quantity)?.unit ?? '1';
    const text = formatScalar(shown, unit, register.evidence.settings.rounding);
    return symbols.length === 1 ? text : `${symbolName(register, quantity)} = ${text}`;
  });
  const free = `With ${listInWords(symbols)}${symbols.length === 1 ? ' alone' : ''} free`;
  return `${free}, ${trialsInWords(register, comparison.selection.series, figures)} give ${listInWords(values)}${goodness(figures)}.`;
}

/** "10 of the 12 trials of series A". */
function trialsInWords(register: Register, series: readonly string[], { used, outside }: Figures): string {
  const all = used.length + outside.length;
  const count = outside.length === 0 ? `all ${all} trials` : `${used.length} of the ${all} trials`;
  const names = listInWords(series.map((id) => seriesName(register, id)));
  return names === '' ? count : `${count} of ${names}`;
}

function goodness({ chiSquared, degreesOfFreedom }: Figures): string {
  if (chiSquared === null || degreesOfFreedom === null) return '';
  const degrees = `${degreesOfFreedom} degree${degreesOfFreedom === 1 ? '' : 's'} of freedom`;
  return `; χ² is ${figureInWords(chiSquared)} for ${degrees}`;
}

function predictionSentence({ register, data }: SolvedContext, figures: Figures): string {
  const { points } = figures;
  const model = startSentence(modelName(register, data.model.id));
  const judged = points.filter(({ trusted, z }) => trusted && z !== null);
  if (judged.length === 0)
    return `${model} is set against ${counted(figures.used.length, 'trial')}, but nothing is known of the uncertainty of the difference.`;
  return `${agreement(register, judged, 'setting')} ${worstMiss(register, judged)}`;
}

/** "Four of seven leans agree within 2 u." */
export function agreement(register: Register, judged: readonly ComparisonPoint[], noun: string): string {
  const { k } = register.evidence.settings;
  const agreeing = judged.filter(({ z }) => z !== null && Math.abs(z) <= k).length;
  const plural = judged.length === 1 ? noun : `${noun}s`;
  if (judged.length === 1)
    return `The one ${noun} ${agreeing === 1 ? 'agrees' : 'does not agree'} within ${k}\u00a0u.`;
  if (agreeing === judged.length)
    return `All ${countInWords(judged.length)} ${plural} agree within ${k}\u00a0u.`;
  const verb = agreeing === 1 ? 'agrees' : 'agree';
  return startSentence(
    `${countInWords(agreeing)} of ${countInWords(judged.length)} ${plural} ${verb} within ${k}\u00a0u.`,
  );
}

/** "The model misses most at θ = 55°, by 3.6 u: measured 39.7 cm, predicted 42.2 ± 0.6 cm." */
export function worstMiss(register: Register, judged: readonly ComparisonPoint[]): string {
  const worst = judged.reduce((a, b) => (Math.abs(b.z ?? 0) > Math.abs(a.z ?? 0) ? b : a));
  const { rounding } = register.evidence.settings;
  const { measured, predicted } = worst;
  const where = settingsInWords(register, variedSettings(judged, worst));
  const sides =
    predicted === null
      ? ''
      : `: predicted ${formatScalar(predicted, predicted.unit, rounding)}, measured ${measured.u === null ? formatValue(measured, measured.unit, rounding) : formatScalar(measured, measured.unit, rounding)}`;
  return `The model misses most at ${where}, by ${figureInWords(Math.abs(worst.z ?? 0))}\u00a0u${sides}.`;
}

/** Of a point's settings those that are not the same at all points; all of them where none differs. */
function variedSettings(
  points: readonly ComparisonPoint[],
  point: ComparisonPoint,
): ComparisonPoint['settings'] {
  const entries = Object.entries(point.settings);
  const varied = entries.filter(([id]) => points.some((other) => other.at[id] !== point.at[id]));
  return Object.fromEntries(varied.length === 0 ? entries : varied);
}
