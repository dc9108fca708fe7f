import { expect } from 'vitest';

declare module 'vitest' {
  interface Matchers<T> {
    /** Relative agreement to a number of significant digits; absolute when the expected value is 0. */
    toAgreeTo(expected: number, options: { digits: number }): T;
  }
}

expect.extend({
  toAgreeTo(received: unknown, expected: number, { digits }: { digits: number }) {
    const value = Number(received);
    const error = expected === 0 ? Math.abs(value) : Math.abs(value - expected) / Math.abs(expected);
    const reached = error === 0 ? Infinity : -Math.log10(error);
    return {
      pass: Number.isFinite(value) && reached >= digits,
      message: () =>
        `expected ${value} ${this.isNot ? 'not ' : ''}to agree with ${expected} to ${digits} digits; it agrees to ${reached.toFixed(2)}`,
    };
  },
});
