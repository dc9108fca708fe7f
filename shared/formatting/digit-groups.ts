const NARROW = '\u202F';

/**
 * Figures in groups of three on both sides of the point, split by a narrow no-break space; groups of four stand
 * undivided. The minus is U+2212. Source: SI Brochure, 9th edition, section 5.4.4.
 *
 * @param text - plain figures with a point
 * @param separator - between groups; default the narrow no-break space
 * @example groupDigits('-12345.6', ' ') // => '−12 345.6'
 * @example groupDigits('100.02147', ' ') // => '100.021 47'
 * @example groupDigits('1234.5678') // => '1234.5678'
 */
export function groupDigits(text: string, separator = NARROW): string {
  const [, sign = '', whole = '', part = ''] = /^(-?)(\d*)(?:\.(\d*))?$/u.exec(text) ?? [];
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(?:\d{3})+$)/gu, separator) : whole;
  const decimals = part.length > 4 ? part.replace(/(\d{3})(?=\d)/gu, `$1${separator}`) : part;
  return `${sign === '-' ? '−' : ''}${grouped}${part === '' ? '' : `.${decimals}`}`;
}
