/** A constant of nature with its standard uncertainty (0: exact by definition) and where its value is from. */
export interface PhysicalConstant {
  readonly symbol: string;
  readonly name: string;
  readonly value: number;
  readonly u: number;
  readonly unit: string;
  readonly source: string;
}

const EXACT = 'exact in the SI, SI Brochure 9th edition (2019)';
const CODATA = 'CODATA 2022';

/**
 * Constants that experiments of a tournament meet.
 *
 * Source: beside each; CODATA 2022 where it is measured.
 *
 * @example PHYSICAL_CONSTANTS.c.value // => 299792458
 */
export const PHYSICAL_CONSTANTS = {
  c: { symbol: 'c', name: 'speed of light', value: 299792458, u: 0, unit: 'm/s', source: EXACT },
  h: { symbol: 'h', name: 'Planck constant', value: 6.62607015e-34, u: 0, unit: 'J s', source: EXACT },
  e: { symbol: 'e', name: 'elementary charge', value: 1.602176634e-19, u: 0, unit: 'C', source: EXACT },
  k: { symbol: 'k', name: 'Boltzmann constant', value: 1.380649e-23, u: 0, unit: 'J/K', source: EXACT },
  NA: { symbol: 'N_A', name: 'Avogadro constant', value: 6.02214076e23, u: 0, unit: '1/mol', source: EXACT },
  gn: { symbol: 'g_n', name: 'standard gravity', value: 9.80665, u: 0, unit: 'm/s^2', source: EXACT },
  G: {
    symbol: 'G',
    name: 'constant of gravitation',
    value: 6.6743e-11,
    u: 0.00015e-11,
    unit: 'm^3/(kg s^2)',
    source: CODATA,
  },
  me: {
    symbol: 'm_e',
    name: 'electron mass',
    value: 9.1093837139e-31,
    u: 0.0000000028e-31,
    unit: 'kg',
    source: CODATA,
  },
  eps0: {
    symbol: 'ε_0',
    name: 'electric constant',
    value: 8.8541878188e-12,
    u: 0.0000000014e-12,
    unit: 'F/m',
    source: CODATA,
  },
  mu0: {
    symbol: 'μ_0',
    name: 'magnetic constant',
    value: 1.25663706127e-6,
    u: 0.0000000002e-6,
    unit: 'N/A^2',
    source: CODATA,
  },
} as const satisfies Readonly<Record<string, PhysicalConstant>>;
