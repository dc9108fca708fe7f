import { rangesLeft, type Correlated, type ValidRange } from './validity.ts';

const ZERO_CELSIUS = 273.15;
const PRESSURE: ValidRange = { of: 'pressure / hPa', min: 900, max: 1100 };
const TEMPERATURE: ValidRange = { of: 'temperature / °C', min: 10, max: 30 };
const HUMIDITY: ValidRange = { of: 'relative humidity / %', min: 0, max: 80 };
const VISCOSITY_TEMPERATURE: ValidRange = { of: 'temperature / K', min: 170, max: 1900 };

/**
 * Density of moist air by the simple formula of legal metrology.
 *
 * Formula: ρ = (0.34848 p − 0.009 h e^(0.061 t))/(273.15 + t) with p in hPa, h in %, t in °C.
 * Source: OIML R 111-1:2004, annex E.3; the full formula it approximates: A. Picard et al., Metrologia 45, 149 (2008).
 * Accuracy: 2·10⁻⁴ relative within 900 to 1100 hPa, 10 to 30 °C, below 80 %.
 *
 * @param pressure - in Pa
 * @param temperature - in K
 * @param humidity - relative, 0 to 1
 * @returns density in kg/m³, with its uncertainty and the ranges left
 * @example airDensity(101325, 293.15, 0.5).outside.length // => 0
 */
export function airDensity(pressure: number, temperature: number, humidity: number): Correlated {
  const t = temperature - ZERO_CELSIUS;
  const hectopascal = pressure / 100;
  const percent = humidity * 100;
  const value = (0.34848 * hectopascal - 0.009 * percent * Math.exp(0.061 * t)) / temperature;
  return {
    value,
    u: 2e-4 * value,
    outside: rangesLeft([
      [PRESSURE, hectopascal],
      [TEMPERATURE, t],
      [HUMIDITY, percent],
    ]),
  };
}

/**
 * Dynamic viscosity of air by Sutherland's law.
 *
 * Formula: η = 1.716·10⁻⁵ (T/273.15)^(3/2) · 383.55/(T + 110.4) Pa s.
 * Source: W. Sutherland, Phil. Mag. 36, 507 (1893); constants as in textbooks of fluid mechanics.
 * Accuracy: 2 % from 170 to 1900 K.
 *
 * @param temperature - in K, > 0
 * @returns viscosity in Pa s, with its uncertainty and the ranges left
 * @example Math.round(airViscosity(293.15).value * 1e8) // => 1813
 */
export function airViscosity(temperature: number): Correlated {
  const value = (1.716e-5 * (temperature / ZERO_CELSIUS) ** 1.5 * 383.55) / (temperature + 110.4);
  return { value, u: 0.02 * value, outside: rangesLeft([[VISCOSITY_TEMPERATURE, temperature]]) };
}
