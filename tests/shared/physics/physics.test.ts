/** Published values of the physics aids; the source stands beside each. Temperatures in °C are turned to K here. */
import { describe, expect, test } from 'vitest';
import { airDensity, airViscosity } from '#shared/physics/air.ts';
import { PHYSICAL_CONSTANTS } from '#shared/physics/constants.ts';
import {
  frameSpeed,
  motionBlur,
  parallaxCorrected,
  rollingShutterCorrected,
  tiltCorrected,
} from '#shared/physics/film-measures.ts';
import { moistAirDensity } from '#shared/physics/moist-air.ts';
import { normalGravity } from '#shared/physics/normal-gravity.ts';
import { fallFromRest, speedAfterFall, terminalSpeed, throwUp } from '#shared/physics/quadratic-drag.ts';
import { sphereDrag, SPHERE_DRAG, type DragFitName } from '#shared/physics/sphere-drag.ts';
import { waterDensity, waterSurfaceTension, waterViscosity } from '#shared/physics/water.ts';

const kelvin = (celsius: number) => celsius + 273.15;
const degrees = (angle: number) => (angle * Math.PI) / 180;

describe('gravity', () => {
  // J. Geodesy 74, 128 (2000): the constants of the closed form at the equator and the pole.
  test.each([
    [0, 9.7803267715, 11],
    [90, 9.8321863685, 9],
    // C41 of the trade's list of calculations: rounded values at 45° and 52°.
    [45, 9.8062, 6],
    [52, 9.81248, 6],
  ])('at latitude %d°: %d m/s²', (latitude, expected, digits) => {
    expect(normalGravity(degrees(latitude), 0)).toAgreeTo(expected, { digits: digits - 1 });
  });

  test('higher up: falls by 3.086e-6 of its unit for each metre', () => {
    expect(normalGravity(1, 0) - normalGravity(1, 1000)).toAgreeTo(3.086e-3, { digits: 10 });
  });

  test('beyond the pole: is not a number', () => {
    expect(normalGravity(2, 0)).toBeNaN();
  });
});

describe('air', () => {
  // OIML R 111-1:2004, E.3, recomputed for 1013.25 hPa, 20 °C, 50 %.
  test('density by the simple formula', () => {
    expect(airDensity(101325, kelvin(20), 0.5).value).toAgreeTo(1.1993, { digits: 4 });
  });

  // Metrologia 45, 149 (2008): 1.199314 kg/m³ (read in a source), 1.199313895 recomputed from the formula.
  test('density by the full formula', () => {
    expect(moistAirDensity(101325, kelvin(20), 0.5).value).toAgreeTo(1.199313895, { digits: 9 });
  });

  // Textbook value at 20 °C.
  test('viscosity', () => {
    expect(airViscosity(kelvin(20)).value).toAgreeTo(1.813e-5, { digits: 3.5 });
  });

  test('outside its range: still has a value, and says which range is left', () => {
    const { value, outside } = airDensity(101325, kelvin(60), 0.9);

    expect(value).toBeGreaterThan(0);
    expect(outside.map(({ of }) => of)).toEqual(['temperature / °C', 'relative humidity / %']);
  });
});

describe('water', () => {
  // Metrologia 38, 301 (2001), formula from memory.
  test.each([
    [20, 998.206746],
    [25, 997.047022],
  ])('density at %d °C: %d kg/m³', (celsius, expected) => {
    expect(waterDensity(kelvin(celsius)).value).toAgreeTo(expected, { digits: 8 });
  });

  // IAPWS SR6-08(2011), read in the source.
  test.each([
    [20, 1001.5673e-6],
    [25, 889.99677e-6],
  ])('viscosity at %d °C: %d Pa s', (celsius, expected) => {
    expect(waterViscosity(kelvin(celsius)).value).toAgreeTo(expected, { digits: 7 });
  });

  // IAPWS R1-76(2014): 72.74 mN/m in its table, 72.736140 from its formula.
  test('surface tension at 20 °C', () => {
    expect(waterSurfaceTension(kelvin(20)).value).toAgreeTo(72.73614e-3, { digits: 7 });
  });

  test('above the critical point: has no surface tension', () => {
    expect(waterSurfaceTension(700).value).toBeNaN();
  });
});

describe('sphere drag', () => {
  // The publications' formulas at Re 1, 10 and 100; form B of Clift and Gauvin from memory.
  test.each<[DragFitName, number, number]>([
    ['Schiller-Naumann', 1, 27.6],
    ['Schiller-Naumann', 10, 4.15106594],
    ['Schiller-Naumann', 100, 1.091731091],
    ['Clift-Gauvin A', 1, 27.648082232],
    ['Clift-Gauvin A', 10, 4.13473803],
    ['Clift-Gauvin A', 100, 1.070389382],
    ['Clift-Gauvin B', 1, 27.600009882],
    ['Clift-Gauvin B', 10, 4.151208735],
    ['Clift-Gauvin B', 100, 1.093785707],
  ])('%s at Re %d: %d', (fit, reynolds, expected) => {
    expect(sphereDrag(reynolds, fit).value).toAgreeTo(expected, { digits: 9 });
  });

  // Rounded values at Re 100 of three fits; their spread of 5 % is the honest uncertainty.
  test.each<[DragFitName, number]>([
    ['Schiller-Naumann', 1.092],
    ['Brown-Lawler', 1.073],
    ['Morrison', 1.038],
  ])('%s at Re 100: rounds to %d', (fit, expected) => {
    expect(Math.round(sphereDrag(100, fit).value * 1000) / 1000).toBe(expected);
  });

  test('every fit: nears 24/Re at small Re', () => {
    for (const { coefficient } of Object.values(SPHERE_DRAG))
      expect((coefficient(1e-4) * 1e-4) / 24).toAgreeTo(1, { digits: 2 });
  });

  test('outside the range of the fit: says so', () => {
    expect(sphereDrag(5, 'Stokes').outside).toEqual([{ of: 'Re', min: 0, max: 0.1 }]);
    expect(sphereDrag(0, 'Stokes').value).toBeNaN();
  });
});

describe('quadratic drag', () => {
  // v₀ 15 m/s, vₜ 12 m/s, g 9.81 m/s²: 6.906 m, 1.0961 s, back at 9.370 m/s.
  test('thrown up: height, time and return speed', () => {
    const thrown = throwUp(15, 12, 9.81);

    expect(thrown.height).toAgreeTo(6.906, { digits: 4 });
    expect(thrown.time).toAgreeTo(1.0961, { digits: 4 });
    expect(thrown.returnSpeed).toAgreeTo(9.37, { digits: 4 });
  });

  // Independently recomputed: g 9.81, drag 0.05 per metre (vₜ² = g/0.05), v₀ 30: apex at 1.6191365755411975 s.
  test('thrown up with a drag of 0.05 per metre: apex as an independent integration gives it', () => {
    const thrown = throwUp(30, Math.sqrt(9.81 / 0.05), 9.81);

    expect(thrown.time).toAgreeTo(1.6191365755411975, { digits: 14 });
    expect(thrown.height).toAgreeTo(17.20470385480753, { digits: 14 });
    expect(thrown.returnSpeed).toAgreeTo(12.69187708112415, { digits: 14 });
  });

  // Common practice, no source.
  test('a ball of 40 mm and 2.7 g: leaves at 22 m/s and climbs 7.3 to 8.6 m; its terminal speed is 8 to 9 m/s', () => {
    const ball = { mass: 0.0027, area: Math.PI * 0.02 ** 2, density: 1.2, gravity: 9.81 };
    const climbs = [0.5, 0.4].map((drag) => throwUp(22, terminalSpeed({ ...ball, drag }), 9.81).height);

    expect(climbs[0]).toBeCloseTo(7.3, 0);
    expect(climbs[1]).toBeCloseTo(8.6, 0);
    expect(terminalSpeed({ ...ball, drag: 0.45 })).toBeGreaterThan(8);
    expect(terminalSpeed({ ...ball, drag: 0.45 })).toBeLessThan(9);
  });

  test('falling: speed after the time is the speed after the distance', () => {
    const { speed, distance } = fallFromRest(0.7, 8, 9.81);

    expect(speedAfterFall(distance, 8, 9.81)).toAgreeTo(speed, { digits: 13 });
  });

  test('falling for long: keeps the terminal speed and does not overflow', () => {
    expect(fallFromRest(1e6, 8, 9.81)).toEqual({ speed: 8, distance: expect.closeTo(8e6, -2) as number });
  });
});

describe('film', () => {
  // Common practice, no source: two ends of ±½ frame each.
  test('speed from 24 of 240 frames a second over a metre: 10 m/s with u of √(2/12)/24', () => {
    const speed = frameSpeed({ value: 1, u: 0 }, { value: 240, u: 0 }, 24);

    expect(speed.value).toBe(10);
    expect(speed.u / speed.value).toAgreeTo(Math.sqrt(2 / 12) / 24, { digits: 14 });
  });

  test('no frame counted: is refused', () => {
    expect(() => frameSpeed({ value: 1, u: 0 }, { value: 240, u: 0 }, 0)).toThrow(
      'frameSpeed: needs at least 1 frame, got 0',
    );
  });

  test('a bar behind the motion, a tilted camera, an open shutter and a slow read-out: each corrected', () => {
    expect(parallaxCorrected({ value: 1, u: 0 }, { value: 0, u: 0.02 }, 2).u).toAgreeTo(0.01, { digits: 14 });
    expect(tiltCorrected({ value: 1, u: 0 }, { value: degrees(60), u: 0 }).value).toAgreeTo(2, {
      digits: 14,
    });
    expect(motionBlur(-10, 0.001).u).toAgreeTo(0.01 / Math.sqrt(12), { digits: 14 });
    expect(rollingShutterCorrected(10, 0.01)).toAgreeTo(10 / 1.1, { digits: 14 });
  });
});

describe('constants', () => {
  // CODATA 2022; speed of light and standard gravity are exact.
  test('carry their value, uncertainty and year', () => {
    expect(PHYSICAL_CONSTANTS.G).toMatchObject({ value: 6.6743e-11, u: 1.5e-15, source: 'CODATA 2022' });
    expect(PHYSICAL_CONSTANTS.c).toMatchObject({ value: 299792458, u: 0 });
  });
});
