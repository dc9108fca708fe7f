/** Semi-axis a in m, flattening and normal gravity at the equator of the GRS80 ellipsoid. */
const EQUATOR = 9.7803267715;
const FORMULA_CONSTANT = 0.001931851353;
const FIRST_ECCENTRICITY_SQUARED = 0.0066943800229;
/** Fall of gravity with height near the ground, s⁻². */
const FREE_AIR = 3.086e-6;

/**
 * Acceleration of free fall at a place, from its latitude and height.
 *
 * Formula: g = gₑ(1 + k s²)/√(1 − e² s²) − 3.086·10⁻⁶ s⁻² · H with s = sin φ (Somigliana's closed form, GRS80).
 * Source: H. Moritz, Geodetic Reference System 1980, J. Geodesy 74, 128 (2000).
 * Accuracy: the formula is exact for the ellipsoid; the ground below adds anomalies of about 5·10⁻⁴ m/s² (common
 * practice, no source), which the caller states as its uncertainty.
 *
 * @param latitude - geographic latitude φ in rad, −π/2 to π/2
 * @param height - above sea level in m, up to a few kilometres
 * @returns g in m/s²; NaN outside the domain
 * @example Math.abs(normalGravity(Math.PI / 4, 0) - 9.8062) < 1e-5 // => true
 */
export function normalGravity(latitude: number, height: number): number {
  if (!(Math.abs(latitude) <= Math.PI / 2)) return NaN;
  const square = Math.sin(latitude) ** 2;
  const onEllipsoid =
    (EQUATOR * (1 + FORMULA_CONSTANT * square)) / Math.sqrt(1 - FIRST_ECCENTRICITY_SQUARED * square);
  return onEllipsoid - FREE_AIR * height;
}
