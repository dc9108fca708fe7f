import { z } from 'zod';

const ALPHABET = 'abcdefghijkmnpqrstuvwxyz23456789';

/** Short id of a block: its address in the report (`#a-k7m2qf`). Letters and digits that cannot be confused. */
export const anchorSchema = z.string().regex(/^[a-z0-9]{4,12}$/);

/**
 * Makes an anchor from random bytes; the caller brings the randomness.
 *
 * @param bytes - at least 6; each gives one character
 * @returns one character a byte, at most 12
 * @throws RangeError when fewer than 6 bytes are given
 * @example anchorFromBytes([0, 1, 2, 31, 32, 33]) // => 'abc9ab'
 */
export function anchorFromBytes(bytes: ArrayLike<number>): string {
  if (bytes.length < 6) throw new RangeError(`anchorFromBytes: needs 6 bytes or more, got ${bytes.length}`);
  return Array.from(bytes)
    .slice(0, 12)
    .map((byte) => ALPHABET.charAt(byte % ALPHABET.length))
    .join('');
}
