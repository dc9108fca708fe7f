/**
 * One value, one text: JSON in the canonical form, so that equal content has an equal fingerprint wherever it is made.
 *
 * Source: RFC 8785 (JSON Canonicalization Scheme): members in the order of their UTF-16 code units, numbers and
 * strings as ECMAScript writes them, no space. Members without a value are left out, as JSON leaves them out.
 *
 * @param value - plain data: objects, lists, strings, finite numbers, booleans, null
 * @throws TypeError on what JSON cannot carry: a number that is not finite, half of a surrogate pair, a function
 * @example canonicalJson({ b: [1, 1e21], a: 'ä' }) // => '{"a":"ä","b":[1,1e+21]}'
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === 'boolean') return String(value);
  if (typeof value === 'string') return canonicalString(value);
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError(`canonicalJson: needs finite numbers, got ${value}`);
    return JSON.stringify(value);
  }
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value !== 'object') throw new TypeError(`canonicalJson: needs plain data, got ${typeof value}`);
  const members = Object.entries(value)
    .filter(([, part]) => part !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([key, part]) => `${canonicalString(key)}:${canonicalJson(part)}`);
  return `{${members.join(',')}}`;
}

/** Half of a pair alone has no UTF-8 form, so two different texts would get one fingerprint. */
const LONE_SURROGATE = /[\uD800-\uDBFF](?![\uDC00-\uDFFF])|(?<![\uD800-\uDBFF])[\uDC00-\uDFFF]/;

function canonicalString(text: string): string {
  if (LONE_SURROGATE.test(text))
    throw new TypeError('canonicalJson: needs whole characters, got half of one');
  return JSON.stringify(text);
}
