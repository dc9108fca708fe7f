/** Measuring from film: clock, scale, viewing and blur, each with what it does to a speed or a length. */

/** A value with its standard uncertainty, in one unit. */
export interface Uncertain {
  readonly value: number;
  readonly u: number;
}

/** Standard deviation of an even spread of width 1. */
const EVEN = Math.sqrt(1 / 12);

/**
 * Speed from a distance that took a counted number of frames.
 *
 * Formula: v = s f/N; (u(v)/v)² = (u(s)/s)² + (u(f)/f)² + (2/12)/N²: each end lies anywhere within its frame.
 * Source: JCGM 100:2008, 4.3.7 and 5.1.2; two ends of ±½ frame each (common practice, no source).
 *
 * @param distance - s in m with its u
 * @param frameRate - f in Hz with its u: how fast the pictures were taken, not how fast they are shown
 * @param frames - N ≥ 1, counted from end to end
 * @returns speed in m/s with its standard uncertainty
 * @throws RangeError when fewer than one frame was counted
 * @example Math.round(frameSpeed({ value: 1, u: 0 }, { value: 240, u: 0 }, 24).value) // => 10
 */
export function frameSpeed(distance: Uncertain, frameRate: Uncertain, frames: number): Uncertain {
  if (!(frames >= 1)) throw new RangeError(`frameSpeed: needs at least 1 frame, got ${frames}`);
  const value = (distance.value * frameRate.value) / frames;
  const relative = Math.hypot(
    distance.u / distance.value,
    frameRate.u / frameRate.value,
    (Math.SQRT2 * EVEN) / frames,
  );
  return { value, u: Math.abs(value) * relative };
}

/**
 * A length whose scale bar lay in another plane than the motion.
 *
 * Formula: s = s′(1 + δ/L), with δ how much farther from the camera the motion was than the bar and L the distance of
 * the camera to the bar; u from u(δ) and u(s′). Source: similar triangles.
 *
 * @param apparent - s′ in m with its u, as the bar says
 * @param offset - δ in m with its u, positive when the motion was farther away
 * @param cameraDistance - L in m, > 0
 * @returns the true length in m with its standard uncertainty
 * @example parallaxCorrected({ value: 1, u: 0 }, { value: 0.1, u: 0 }, 2).value // => 1.05
 */
export function parallaxCorrected(apparent: Uncertain, offset: Uncertain, cameraDistance: number): Uncertain {
  const factor = 1 + offset.value / cameraDistance;
  return {
    value: apparent.value * factor,
    u: Math.hypot(apparent.u * factor, (apparent.value * offset.u) / cameraDistance),
  };
}

/**
 * A length along a direction that was not square to the line of sight.
 *
 * Formula: s = s′/cos θ; u(s) = s tan θ u(θ) beside that of s′. Source: projection.
 *
 * @param apparent - s′ in m with its u
 * @param tilt - θ in rad with its u, below π/2
 * @returns the true length in m with its standard uncertainty
 * @throws RangeError when the tilt is a right angle or more
 * @example Math.round(tiltCorrected({ value: 1, u: 0 }, { value: Math.PI / 3, u: 0 }).value * 1e6) // => 2000000
 */
export function tiltCorrected(apparent: Uncertain, tilt: Uncertain): Uncertain {
  if (!(Math.abs(tilt.value) < Math.PI / 2))
    throw new RangeError(`tiltCorrected: needs a tilt below a right angle, got ${tilt.value} rad`);
  const value = apparent.value / Math.cos(tilt.value);
  return {
    value,
    u: Math.hypot(apparent.u / Math.cos(tilt.value), value * Math.tan(tilt.value) * tilt.u),
  };
}

/**
 * Radius from the picture's centre, freed of the lens's distortion.
 *
 * Formula: r = r′(1 + k₁ r′²). Source: D. C. Brown, Photogrammetric Engineering 32, 444 (1966), first radial term.
 *
 * @param radius - r′ as seen, in any one unit U
 * @param k1 - first radial coefficient in U⁻²
 * @returns the radius in U
 * @example undistorted(2, 0.01) // => 2.08
 */
export function undistorted(radius: number, k1: number): number {
  return radius * (1 + k1 * radius * radius);
}

/**
 * Depth as it looks from above through a flat surface.
 *
 * Formula: d′ = d/n for small angles. Source: law of refraction.
 *
 * @param depth - true depth d in m
 * @param refractiveIndex - n of what one looks into, relative to what one looks from; water about 1.33
 * @returns apparent depth in m
 * @example apparentDepth(1.33, 1.33) // => 1
 */
export function apparentDepth(depth: number, refractiveIndex: number): number {
  return depth / refractiveIndex;
}

/**
 * How far something moves while the shutter is open, and what that does to its edge.
 *
 * Formula: b = v tₑ; u = b/√12 when either end of the blur may have been taken (common practice, no source).
 *
 * @param speed - v in m/s
 * @param exposure - tₑ in s
 * @returns blur in m with the standard uncertainty of an edge read in it
 * @example motionBlur(10, 0.001).value // => 0.01
 */
export function motionBlur(speed: number, exposure: number): Uncertain {
  const value = Math.abs(speed) * exposure;
  return { value, u: value * EVEN };
}

/**
 * Speed along the read-out of a sensor that reads row after row.
 *
 * Formula: v = v′/(1 + v′ τ), τ the read-out time for each metre in the picture, positive along the read-out.
 * Source: kinematics; measure τ with a marker that turns (common practice, no source).
 *
 * @param apparent - v′ in m/s, positive along the read-out
 * @param delay - τ in s/m
 * @returns speed in m/s
 * @example rollingShutterCorrected(10, 0) // => 10
 */
export function rollingShutterCorrected(apparent: number, delay: number): number {
  return apparent / (1 + apparent * delay);
}
