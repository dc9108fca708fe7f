/**
 * Corrected Akaike information criterion for known uncertainties: the lower of two models is the better bet.
 *
 * Formula: AICc = χ² + 2k + 2k(k + 1)/(n − k − 1). Only values from the same observations with the same
 * uncertainties may be compared. Source: C. M. Hurvich, C.-L. Tsai, Biometrika 76, 297 (1989).
 *
 * @param chiSquared - least χ² ≥ 0
 * @param parameters - number k ≥ 0 of free parameters
 * @param observations - number n ≥ 1
 * @returns AICc, or null when n ≤ k + 1: then there are too few observations for the correction
 * @throws RangeError when χ² is negative or a count is not a whole number
 * @example aicc(10, 2, 12).toFixed(6) // => '15.333333'
 */
export function aicc(chiSquared: number, parameters: number, observations: number): number | null {
  if (!(chiSquared >= 0)) throw new RangeError(`aicc: needs chi-squared ≥ 0, got ${chiSquared}`);
  if (!Number.isInteger(parameters) || !Number.isInteger(observations) || parameters < 0 || observations < 1)
    throw new RangeError(
      `aicc: needs whole counts, got ${parameters} parameters and ${observations} observations`,
    );
  const left = observations - parameters - 1;
  if (left <= 0) return null;
  return chiSquared + 2 * parameters + (2 * parameters * (parameters + 1)) / left;
}
