/** What the team knows of the falling cups before any trial: instruments and quantities. */
import type { Instrument, Quantity } from '#shared/evidence/evidence.ts';

export const CUPS_INSTRUMENTS: Instrument[] = [
  {
    id: 'i-frames',
    name: 'frame count',
    note: 'Leading edge, to the nearest half frame at either end.',
    parts: [
      {
        kind: 'scale',
        amount: '0.0125',
        unit: '1',
        shape: 'normal',
        shared: false,
        degreesOfFreedom: 30,
        reason:
          'drops of one stack scatter by 1.25 %, pooled over all stacks; half a frame at either end is in it',
      },
      {
        kind: 'scale',
        amount: '0.0029',
        unit: '1',
        shape: 'normal',
        shared: true,
        reason: 'parallax: cups within 2 cm of the plane of the bar, camera 4 m away',
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

function derived(id: string, symbol: string, name: string, unit: string, expr: string): Quantity {
  return { id, symbol, name, unit, status: 'measured', def: { origin: 'derived', expr } };
}

function predicted(id: string, symbol: string, name: string, unit: string): Quantity {
  return { id, symbol, name, unit, status: 'predicted', def: { origin: 'predicted', model: 'model-2' } };
}

export const CUPS_QUANTITIES: Quantity[] = [
  {
    id: 'q-n',
    symbol: 'n',
    name: 'cups in the stack',
    unit: '1',
    status: 'measured',
    source: 'counted',
    def: { origin: 'recorded', instrument: null },
  },
  {
    id: 'q-frames',
    symbol: 'N',
    name: 'frames across the window',
    unit: 'frames',
    status: 'measured',
    source: 'film, every drop',
    def: { origin: 'recorded', instrument: 'i-frames' },
  },
  constant('q-window', 's', 'window', ['1.000', 'm', '0.001'], 'measured', 'scale bar in the picture'),
  constant('q-top', 'y_1', 'release to the window', ['2.20', 'm', '0.01'], 'measured', 'tape measure'),
  constant('q-rate', 'f', 'frame rate', ['119.88', 'frames/s', '0.06'], 'measured', 'counting light display'),
  constant(
    'q-m1',
    'm_1',
    'mass of one cup',
    ['0.842', 'g', '0.0004'],
    'measured',
    '20 cups on a 0.01 g balance',
  ),
  constant(
    'q-dia',
    'D',
    'diameter of the rim',
    ['98.0', 'mm', '0.5'],
    'measured',
    'six diameters; paper gives way',
  ),
  constant(
    'q-rho',
    'ρ',
    'density of the air',
    ['1.1825', 'kg/m^3', '0.0024'],
    'published',
    'from 22 °C, 1006 hPa and 45 % humidity',
  ),
  constant(
    'q-nu',
    'ν',
    'kinematic viscosity of the air',
    ['1.54e-5', 'm^2/s'],
    'published',
    'handbook, 22 °C',
  ),
  constant('q-g', 'g', 'free fall', ['9.8125', 'm/s^2', '0.0005'], 'published', 'from latitude and altitude'),
  derived('q-v', 'v', 'speed in the window', 'm/s', '{q-window}*{q-rate}/{q-frames}'),
  derived('q-m', 'm', 'mass of the stack', 'g', '{q-n}*{q-m1}'),
  derived('q-area', 'A', 'area of the rim', 'cm^2', 'pi/4*{q-dia}^2'),
  derived('q-ma', 'm_a', 'air carried along', 'g', '8/3*{q-rho}*({q-dia}/2)^3'),
  derived('q-re', 'R_e', 'Reynolds number', '1', '{q-v}*{q-dia}/{q-nu}'),
  {
    id: 'q-cd',
    symbol: 'C_d',
    name: 'resistance coefficient',
    unit: '1',
    status: 'fitted',
    source: 'fitted to series A',
    def: { origin: 'fitted', comparison: 'c-approach' },
  },
  predicted('q-vt', 'v_t', 'final speed', 'm/s'),
  predicted('q-lambda', 'λ', 'length of the approach', 'm'),
];
