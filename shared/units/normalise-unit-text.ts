const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * One way of writing for the many that people paste: raised figures become `^`, every dot and cross a `·`,
 * every dash a minus, both micro signs one.
 *
 * @example normaliseUnitText('m·s⁻²') // => 'm·s^-2'
 * @example normaliseUnitText('N × m²') // => 'N·m^2'
 */
export function normaliseUnitText(text: string): string {
  return text
    .replace(/[\s\u00A0\u2009\u202F]+/gu, ' ')
    .trim()
    .replace(/([⁺⁻]?)([⁰¹²³⁴⁵⁶⁷⁸⁹]+)/gu, (_, sign: string, figures: string) => {
      const plain = [...figures].map((figure) => RAISED.indexOf(figure)).join('');
      return `^${sign === '⁻' ? '-' : ''}${plain}`;
    })
    .replace(/\*\*/gu, '^')
    .replace(/ ?[·⋅∙•×*] ?/gu, '·')
    .replace(/[−–‐‑]/gu, '-')
    .replace(/\u03BC/gu, 'µ')
    .replace(/\u2126/gu, 'Ω')
    .replace(/\u212B/gu, 'Å')
    .replace(/℃/gu, '°C')
    .replace(/\u00BA/gu, '°')
    .replace(/ ?([/^()]) ?/gu, (_, sign: string) => sign);
}
