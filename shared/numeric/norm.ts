/** Between these bounds a sum of squares has neither overflowed nor lost terms to underflow. */
const SAFE_LOW = 1e-280;
const SAFE_HIGH = 1e280;

/**
 * Euclidean length of a vector, or of its tail, without overflow or underflow.
 *
 * Formula: √Σ vᵢ² for i ≥ from; scaled by the largest |vᵢ| only where the plain sum of squares is out of range.
 *
 * @param vector - length n
 * @param from - first index that counts, default 0
 * @returns the length; 0 for none; NaN when an element is NaN, Infinity when one is infinite
 * @example norm(Float64Array.of(3e200, 4e200)) // => 5e200
 */
export function norm(vector: Float64Array, from = 0): number {
  const tail = from === 0 ? vector : vector.subarray(from);
  let squares = 0;
  let largest = 0;
  for (const element of tail) squares += element * element;
  if (squares > SAFE_LOW && squares < SAFE_HIGH) return Math.sqrt(squares);
  for (const element of tail) largest = Math.max(largest, Math.abs(element));
  if (largest === 0 || !Number.isFinite(largest)) return largest;
  squares = 0;
  for (const element of tail) squares += (element / largest) ** 2;
  return largest * Math.sqrt(squares);
}
