/** What the team knows of the braked magnet before any trial: instruments and quantities. */
import type { Instrument, Quantity } from '#shared/evidence/evidence.ts';

export const MAGNET_INSTRUMENTS: Instrument[] = [
  {
    id: 'i-balance',
    name: 'balance',
    parts: [{ kind: 'resolution', amount: '0.01', unit: 'g', shape: 'rectangular', shared: false }],
  },
  {
    id: 'i-coils',
    name: 'pick-up coils',
    note: 'Into the audio input at 48 kHz; zero crossings to 0.2 ms.',
    parts: [
      {
        kind: 'scale',
        amount: '0.0074',
        unit: '1',
        shape: 'normal',
        shared: false,
        degreesOfFreedom: 25,
        reason: 'drops of one mass scatter by 0.74 %, pooled over all masses; the crossings are in it',
      },
    ],
  },
];

function constant(
  id: string,
  symbol: string,
  name: string,
  reading: [string, string, string?],
  status: Quantity['status'],
  source: string,
): Quantity {
  const [text, unit, u] = reading;
  return {
    id,
    symbol,
    name,
    unit,
    status,
    source,
    def: { origin: 'constant', reading: { text, unit, ...(u === undefined ? {} : { u }) }, parts: [] },
  };
}

export const MAGNET_QUANTITIES: Quantity[] = [
  {
    id: 'q-m',
    symbol: 'm',
    name: 'mass of magnet and slugs',
    unit: 'g',
    status: 'measured',
    source: 'balance, every mass',
    def: { origin: 'recorded', instrument: 'i-balance' },
  },
  {
    id: 'q-t',
    symbol: 't',
    name: 'time between the coils',
    unit: 's',
    status: 'measured',
    source: 'pick-up coils, every drop',
    def: { origin: 'recorded', instrument: 'i-coils' },
  },
  constant('q-l', 'L', 'distance of the coils', ['400.0', 'mm', '0.5'], 'measured', 'steel rule'),
  constant('q-a', 'a', 'bore radius of the pipe', ['10.00', 'mm', '0.02'], 'measured', 'inside caliper'),
  constant('q-w', 'w', 'wall of the pipe', ['1.00', 'mm', '0.01'], 'measured', 'micrometer'),
  constant(
    'q-sigma',
    'σ',
    'conductivity of the pipe',
    ['4.70e7', 'S/m', '0.03e7'],
    'measured',
    'four-wire, 1.000 m at 5 A',
  ),
  constant('q-g', 'g', 'free fall', ['9.8125', 'm/s^2', '0.0005'], 'published', 'from latitude and altitude'),
  constant(
    'q-mu0',
    'μ_0',
    'magnetic constant',
    ['1.25663706127e-6', 'N/A^2', '0.00000000020e-6'],
    'published',
    'CODATA 2022',
  ),
  constant(
    'q-form',
    'φ',
    'finite length of the magnet',
    ['0.980', '1', '0.010'],
    'published',
    'field of a uniformly magnetised cylinder',
  ),
  {
    id: 'q-p',
    symbol: 'p',
    name: 'moment of the magnet',
    unit: 'A m^2',
    status: 'measured',
    source: 'on-axis field 135 µT at 120.0 mm, magnet reversed',
    def: {
      origin: 'constant',
      reading: { text: '1.170', unit: 'A m^2' },
      parts: [
        {
          kind: 'scale',
          amount: '0.0125',
          unit: '1',
          shape: 'normal',
          shared: true,
          reason: 'distance of the probe, 0.5 mm',
        },
        {
          kind: 'scale',
          amount: '0.010',
          unit: '1',
          shape: 'normal',
          shared: true,
          reason: 'gain of the probe',
        },
        {
          kind: 'scale',
          amount: '0.004',
          unit: '1',
          shape: 'normal',
          shared: true,
          reason: 'residual field',
        },
        {
          kind: 'scale',
          amount: '0.002',
          unit: '1',
          shape: 'normal',
          shared: true,
          reason: 'drift of the probe',
        },
      ],
    },
  },
  {
    id: 'q-v',
    symbol: 'v',
    name: 'steady speed',
    unit: 'm/s',
    status: 'measured',
    def: { origin: 'derived', expr: '{q-l}/{q-t}' },
  },
  {
    id: 'q-k',
    symbol: 'k',
    name: 'brake constant',
    unit: 'N s/m',
    status: 'fitted',
    source: 'fitted to series A',
    def: { origin: 'fitted', comparison: 'c-origin' },
  },
  {
    id: 'q-kd',
    symbol: 'k_d',
    name: 'brake constant of a dipole',
    unit: 'N s/m',
    status: 'predicted',
    def: { origin: 'predicted', model: 'model-2' },
  },
  {
    id: 'q-kc',
    symbol: 'k_c',
    name: 'brake constant of the cylinder',
    unit: 'N s/m',
    status: 'predicted',
    def: { origin: 'predicted', model: 'model-3' },
  },
];
