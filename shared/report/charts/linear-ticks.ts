const ROUNDING = 1e-9;

/** Ticks of an axis and the step between them. */
export interface LinearTicks {
  readonly step: number;
  readonly values: readonly number[];
}

/**
 * Round tick values inside a range: steps of 1, 2 or 5 times a power of ten, as many as come nearest to what is asked.
 *
 * @param min - lower end of the axis
 * @param max - upper end, above `min`
 * @param count - how many steps are wanted
 * @example linearTicks(-2.2, 60, 6).values // => [0, 10, 20, 30, 40, 50, 60]
 * @example linearTicks(28.2, 50.1, 4).values // => [30, 35, 40, 45, 50]
 */
export function linearTicks(min: number, max: number, count: number): LinearTicks {
  if (!(max > min) || !(count > 0)) {
    throw new RangeError(`linearTicks: needs min < max and a count above 0, got ${min}, ${max}, ${count}`);
  }
  const ideal = (max - min) / count;
  const power = 10 ** Math.floor(Math.log10(ideal));
  const steps = [1, 2, 5, 10].map((factor) => factor * power);
  const step = steps.reduce((best, candidate) =>
    Math.abs(Math.log(candidate / ideal)) < Math.abs(Math.log(best / ideal)) ? candidate : best,
  );
  const first = Math.ceil(min / step - ROUNDING);
  const last = Math.floor(max / step + ROUNDING);
  const values: number[] = [];
  for (let i = first; i <= last; i++) values.push(roundToStep(i * step, step));
  return { step, values };
}

function roundToStep(value: number, step: number): number {
  const digits = Math.max(0, Math.ceil(-Math.log10(step) + ROUNDING));
  return Number(value.toFixed(Math.min(digits, 100))) + 0;
}

/**
 * Text of a tick: as many decimals as the step needs, with a true minus sign.
 *
 * @param value - the tick
 * @param step - the step between ticks; it decides the decimals
 * @param signed - true: a plus stands before values above zero
 * @example tickText(-0.5, 0.5) // => '−0.5'
 * @example tickText(2, 2, true) // => '+2'
 */
export function tickText(value: number, step: number, signed = false): string {
  const magnitude = Math.abs(value);
  const digits = Math.max(0, Math.ceil(-Math.log10(step) - ROUNDING));
  const text =
    magnitude >= 1e6 || (magnitude > 0 && magnitude < 1e-4)
      ? magnitude.toExponential().replace('e+', '·10^').replace('e-', '·10^−')
      : magnitude.toFixed(Math.min(digits, 12));
  const sign = value < 0 ? '−' : signed && value > 0 ? '+' : '';
  return sign + text;
}
