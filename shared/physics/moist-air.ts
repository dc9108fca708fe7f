import { rangesLeft, type Correlated, type ValidRange } from './validity.ts';

const ZERO_CELSIUS = 273.15;
/** Molar gas constant as the formula takes it, J/(mol K). */
const GAS_CONSTANT = 8.314472;
/** Molar masses of dry air (400 µmol/mol of carbon dioxide) and of water, kg/mol. */
const AIR_MASS = 28.96546e-3;
const WATER_MASS = 18.01528e-3;
const RANGES: readonly [ValidRange, ValidRange] = [
  { of: 'pressure / hPa', min: 600, max: 1100 },
  { of: 'temperature / °C', min: 15, max: 27 },
];

/**
 * Density of moist air by the full formula, CIPM-2007, with 400 µmol/mol of carbon dioxide.
 *
 * Formula: ρ = p Mₐ/(Z R T) · (1 − x_v (1 − Mᵥ/Mₐ)); Mₐ = 28.96546 g/mol; x_v from the saturation pressure
 * exp(A T² + B T + C + D/T) and the enhancement factor α + β p + γ t²; Z by its virial expansion in p/T.
 * Source: A. Picard, R. S. Davis, M. Gläser, K. Fujii, Metrologia 45, 149 (2008), equations (1) and A1.1 to A1.4
 * (coefficients from memory).
 * Accuracy: 22·10⁻⁶ relative within 600 to 1100 hPa and 15 to 27 °C.
 *
 * @param pressure - in Pa
 * @param temperature - in K
 * @param humidity - relative, 0 to 1
 * @returns density in kg/m³, with its uncertainty and the ranges left
 * @example Math.round(moistAirDensity(101325, 293.15, 0.5).value * 1e4) // => 11993
 */
export function moistAirDensity(pressure: number, temperature: number, humidity: number): Correlated {
  const t = temperature - ZERO_CELSIUS;
  const saturation = Math.exp(
    1.2378847e-5 * temperature ** 2 - 1.9121316e-2 * temperature + 33.93711047 - 6.3431645e3 / temperature,
  );
  const enhancement = 1.00062 + 3.14e-8 * pressure + 5.6e-7 * t * t;
  const vapour = (humidity * enhancement * saturation) / pressure;
  const value =
    ((pressure * AIR_MASS) / (compressibility(pressure, temperature, vapour) * GAS_CONSTANT * temperature)) *
    (1 - (1 - WATER_MASS / AIR_MASS) * vapour);
  const outside = rangesLeft([
    [RANGES[0], pressure / 100],
    [RANGES[1], t],
  ]);
  return { value, u: 22e-6 * value, outside };
}

function compressibility(pressure: number, temperature: number, vapour: number): number {
  const t = temperature - ZERO_CELSIUS;
  const ratio = pressure / temperature;
  const first =
    1.58123e-6 -
    2.9331e-8 * t +
    1.1043e-10 * t * t +
    (5.707e-6 - 2.051e-8 * t) * vapour +
    (1.9898e-4 - 2.376e-6 * t) * vapour * vapour;
  return 1 - ratio * first + ratio * ratio * (1.83e-11 - 0.765e-8 * vapour * vapour);
}
