import { rangesLeft, type Correlated, type ValidRange } from './validity.ts';

const ZERO_CELSIUS = 273.15;
/** Critical temperature of water, K. */
const CRITICAL = 647.096;
const DENSITY_RANGE: ValidRange = { of: 'temperature / °C', min: 0, max: 40 };
const VISCOSITY_RANGE: ValidRange = { of: 'temperature / K', min: 253.15, max: 383.15 };
const TENSION_RANGE: ValidRange = { of: 'temperature / K', min: 248.15, max: CRITICAL };

/**
 * Density of air-free water at one atmosphere.
 *
 * Formula: ρ = 999.974950 (1 − (t − 3.983035)² (t + 301.797)/(522528.9 (t + 69.34881))) kg/m³, t in °C.
 * Source: M. Tanaka et al., Metrologia 38, 301 (2001), equation (1).
 * Accuracy: standard uncertainty below 0.001 kg/m³ from 0 to 40 °C for pure water; tap water differs by more.
 *
 * @param temperature - in K
 * @returns density in kg/m³, with its uncertainty and the ranges left
 * @example Math.round(waterDensity(293.15).value * 1e3) // => 998207
 */
export function waterDensity(temperature: number): Correlated {
  const t = temperature - ZERO_CELSIUS;
  const value = 999.97495 * (1 - ((t - 3.983035) ** 2 * (t + 301.797)) / (522528.9 * (t + 69.34881)));
  return { value, u: 1e-3, outside: rangesLeft([[DENSITY_RANGE, t]]) };
}

const VISCOSITY_TERMS: readonly (readonly [a: number, b: number])[] = [
  [280.68, -1.9],
  [511.45, -7.7],
  [61.131, -19.6],
  [0.45903, -40],
];

/**
 * Dynamic viscosity of liquid water at 0.1 MPa.
 *
 * Formula: η = 10⁻⁶ Σ aᵢ (T/300 K)^bᵢ Pa s.
 * Source: IAPWS SR6-08(2011), equation (7).
 * Accuracy: 1 % from 253.15 to 383.15 K.
 *
 * @param temperature - in K, > 0
 * @returns viscosity in Pa s, with its uncertainty and the ranges left
 * @example Math.round(waterViscosity(293.15).value * 1e7) // => 10016
 */
export function waterViscosity(temperature: number): Correlated {
  const reduced = temperature / 300;
  const value = VISCOSITY_TERMS.reduce((sum, [a, b]) => sum + a * reduced ** b, 0) * 1e-6;
  return { value, u: 0.01 * value, outside: rangesLeft([[VISCOSITY_RANGE, temperature]]) };
}

/**
 * Surface tension of clean water against its vapour.
 *
 * Formula: σ = 235.8 τ^1.256 (1 − 0.625 τ) mN/m with τ = 1 − T/647.096 K.
 * Source: IAPWS R1-76(2014). Accuracy: 0.5 % at 20 °C. Soap and dust lower it: measure what is not clean.
 *
 * @param temperature - in K, below 647.096
 * @returns surface tension in N/m, with its uncertainty and the ranges left; NaN above the critical point
 * @example Math.round(waterSurfaceTension(293.15).value * 1e5) // => 7274
 */
export function waterSurfaceTension(temperature: number): Correlated {
  const tau = 1 - temperature / CRITICAL;
  const value = 0.2358 * tau ** 1.256 * (1 - 0.625 * tau);
  return { value, u: 0.005 * value, outside: rangesLeft([[TENSION_RANGE, temperature]]) };
}
