/**
 * Motion along a vertical line with drag that grows as the square of speed: closed forms. All take the terminal speed
 * vₜ = √(2 m g/(ρ C_d A)); buoyancy lowers g to g(1 − ρ_f/ρ), which the caller puts in.
 */

/** A body falling from rest. */
export interface Falling {
  /** m/s, downwards. */
  readonly speed: number;
  /** m, downwards. */
  readonly distance: number;
}

/** ln cosh x, without overflow. */
function logCosh(x: number): number {
  const size = Math.abs(x);
  return size + Math.log1p(Math.exp(-2 * size)) - Math.LN2;
}

/**
 * Speed and distance of a body that falls from rest.
 *
 * Formula: v = vₜ tanh(g t/vₜ); y = (vₜ²/g) ln cosh(g t/vₜ). Source: textbooks of mechanics.
 *
 * @param time - in s, ≥ 0
 * @param terminalSpeed - vₜ in m/s, > 0
 * @param gravity - g in m/s², > 0
 * @returns speed and distance, both downwards
 * @example fallFromRest(0, 8, 9.81).distance // => 0
 */
export function fallFromRest(time: number, terminalSpeed: number, gravity: number): Falling {
  const x = (gravity * time) / terminalSpeed;
  return {
    speed: terminalSpeed * Math.tanh(x),
    distance: (terminalSpeed ** 2 / gravity) * logCosh(x),
  };
}

/**
 * Speed of a body after falling a distance from rest.
 *
 * Formula: v = vₜ √(1 − e^(−2 g y/vₜ²)). Source: textbooks of mechanics.
 *
 * @param distance - y in m, ≥ 0
 * @param terminalSpeed - vₜ in m/s, > 0
 * @param gravity - g in m/s², > 0
 * @returns speed in m/s
 * @example speedAfterFall(0, 8, 9.81) // => 0
 */
export function speedAfterFall(distance: number, terminalSpeed: number, gravity: number): number {
  return terminalSpeed * Math.sqrt(-Math.expm1((-2 * gravity * distance) / terminalSpeed ** 2));
}

/** A body thrown straight up. */
export interface Thrown {
  /** Height of the apex above the start, m. */
  readonly height: number;
  /** Time to the apex, s. */
  readonly time: number;
  /** Speed on coming back to the start, m/s. */
  readonly returnSpeed: number;
}

/**
 * Apex and return of a body thrown straight up.
 *
 * Formula: h = (vₜ²/2g) ln(1 + v₀²/vₜ²); t = (vₜ/g) atan(v₀/vₜ); back with v₀/√(1 + v₀²/vₜ²).
 * Source: textbooks of mechanics.
 *
 * @param speed - v₀ in m/s, ≥ 0
 * @param terminalSpeed - vₜ in m/s, > 0
 * @param gravity - g in m/s², > 0
 * @returns height, time and return speed
 * @example throwUp(0, 12, 9.81).height // => 0
 */
export function throwUp(speed: number, terminalSpeed: number, gravity: number): Thrown {
  const ratio = speed / terminalSpeed;
  return {
    height: (terminalSpeed ** 2 / (2 * gravity)) * Math.log1p(ratio * ratio),
    time: (terminalSpeed / gravity) * Math.atan(ratio),
    returnSpeed: speed / Math.sqrt(1 + ratio * ratio),
  };
}

/**
 * Terminal speed of a body with quadratic drag.
 *
 * Formula: vₜ = √(2 m g/(ρ C_d A)). Source: textbooks of mechanics.
 *
 * @param body - mass in kg, area across the flow in m², drag coefficient, density of the fluid in kg/m³, g in m/s²
 * @returns vₜ in m/s
 * @example Math.round(terminalSpeed({ mass: 0.0027, area: Math.PI * 0.02 ** 2, drag: 0.45, density: 1.2, gravity: 9.81 }) * 100) // => 884
 */
export function terminalSpeed(body: {
  readonly mass: number;
  readonly area: number;
  readonly drag: number;
  readonly density: number;
  readonly gravity: number;
}): number {
  return Math.sqrt((2 * body.mass * body.gravity) / (body.density * body.drag * body.area));
}
