import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { canonicalJson } from '#shared/editions/canonical-json.ts';

describe('canonical JSON', () => {
  // RFC 8785, section 3.2.2 and its sample in section 3.2.4.
  test('the sample of RFC 8785, when written: is the text that stands there', () => {
    const sample = {
      numbers: [Number('333333333.33333329'), 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
      string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\"/',
      literals: [null, true, false],
    };

    expect(canonicalJson(sample)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  // RFC 8785, section 3.2.3.
  test('the keys of RFC 8785, when sorted: follow their UTF-16 code units', () => {
    const keys = { '\u20ac': 1, '\r': 2, '\ufb33': 3, '1': 4, '\u{1f600}': 5, '\u0080': 6, '\u00f6': 7 };

    expect(canonicalJson(keys)).toBe(
      '{"\\r":2,"1":4,"\u0080":6,"\u00f6":7,"\u20ac":1,"\u{1f600}":5,"\ufb33":3}',
    );
  });

  test.each<readonly [string, unknown]>([
    ['a number that is not finite', { a: [Infinity] }],
    ['half of a surrogate pair', { a: '\ud83d' }],
    ['a function', { a: () => 1 }],
  ])('%s, when written: is refused', (_name, value) => {
    expect(() => canonicalJson(value)).toThrow(TypeError);
  });

  test('nought below nought, when written: is nought, as JSON has only one', () => {
    expect(canonicalJson([-0])).toBe('[0]');
  });

  test('law: writing, parsing and writing again changes nothing', () => {
    fc.assert(
      fc.property(fc.jsonValue({ noUnicodeString: false }), (value) => {
        const text = canonicalJson(value);
        expect(canonicalJson(JSON.parse(text))).toBe(text);
      }),
    );
  });
});
