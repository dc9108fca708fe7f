/** A typed number taken apart, marks and signs made plain: point, ASCII minus, `e`. */
export interface TypedParts {
  readonly value: string;
  /** Standard uncertainty; null when none was typed. */
  readonly u: string | null;
  /** `44.7(4)`: u counts in the last place of the value. */
  readonly lastDigits: boolean;
  readonly unit: string;
}

/** Why a text cannot be taken apart, and a text to write in its place where one is likely. */
export interface SplitRefusal {
  readonly code: 'empty' | 'not a number' | 'ambiguous text' | 'dimension mismatch';
  readonly sentence: string;
  readonly mend: string | null;
}

const FIGURES = String.raw`[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:e[+-]?\d{1,3}(?![\d.]))?`;
const UNIT = String.raw`(?:[^\d\s.,±+\-()][^±]*?)?`;
const PLAIN = new RegExp(String.raw`^(${FIGURES}) ?(${UNIT})$`, 'u');
const WITH_U = new RegExp(String.raw`^(${FIGURES}) ?(${UNIT}) ?± ?(${FIGURES}) ?(${UNIT})$`, 'u');
const TWO_NUMBERS = new RegExp(String.raw`^(${FIGURES}) (${FIGURES}) ?(${UNIT})$`, 'u');
const CONCISE =
  /^([+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+))\((\d+(?:[.,]\d+)?)\)(e[+-]?\d{1,3})? ?([^\d\s.,±+\-()][^±]*)?$/u;

/**
 * Takes a typed number apart into value, uncertainty and unit, without yet asking what they are worth.
 *
 * @example splitTypedNumber('44,7 +- 0,4 cm') // => { value: '44.7', u: '0.4', lastDigits: false, unit: 'cm' }
 */
export function splitTypedNumber(text: string): TypedParts | SplitRefusal {
  const plain = plainSigns(text);
  if (plain === '') return refuse('empty', 'Write a number, such as 44.7.');
  const marks = bothMarks(plain);
  if (marks !== null) return marks;
  const unbracketed = /^\(([^()]*±[^()]*)\)(.*)$/u.exec(plain);
  const body = unbracketed === null ? plain : `${unbracketed[1]}${unbracketed[2]}`;
  const concise = CONCISE.exec(body);
  if (concise !== null) return fromConcise(concise);
  const withU = WITH_U.exec(body);
  if (withU !== null) return fromPlusMinus(withU);
  const single = PLAIN.exec(body);
  if (single !== null) return { value: point(single[1]), u: null, lastDigits: false, unit: single[2] ?? '' };
  const two = TWO_NUMBERS.exec(body);
  if (two !== null) return fromTwoNumbers(two);
  return notANumber(text.trim(), body);
}

/** `1.2·10⁻³` becomes `1.2e-3`, `+/-` becomes ±, narrow spaces between figures go. */
function plainSigns(text: string): string {
  return text
    .replace(/(\d)[\u2009\u202F\u00A0](?=\d{3}(?!\d))/gu, '$1')
    .replace(/[\s\u00A0\u2009\u202F]+/gu, ' ')
    .trim()
    .replace(/[−–]/gu, '-')
    .replace(
      /(?<=\d) ?[·⋅×*] ?10(?:\^\(?([+-]?\d+)\)?|([⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+))/gu,
      (_, caret?: string, raised?: string) => {
        return `e${caret ?? lowered(raised ?? '')}`;
      },
    )
    .replace(/(?<=[\d.])E(?=[+-]?\d)/gu, 'e')
    .replace(/ ?(?:\+\/-|\+-|\+ -) ?/gu, ' ± ')
    .replace(/ ?± ?/gu, ' ± ')
    .replace(/\) e(?=[+-]?\d)/gu, ')e')
    .replace(/(?<=\d) \((?=[\d.,]+\))/gu, '(')
    .trim();
}

function lowered(raised: string): string {
  return [...raised]
    .map((sign) => (sign === '⁻' ? '-' : sign === '⁺' ? '' : String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(sign))))
    .join('');
}

function bothMarks(text: string): SplitRefusal | null {
  const match = /\d[\d.,']*[.,'][\d.,']*[.,'][\d.,']*|\d*['][\d.,']*/u.exec(text);
  if (match === null) return null;
  const [typed] = match;
  const marks = typed.replace(/\d/gu, '');
  const last = Math.max(typed.lastIndexOf('.'), typed.lastIndexOf(','));
  const repeated = new Set(marks).size === 1;
  const mend = repeated
    ? typed.replace(/[.,']/gu, '')
    : `${typed.slice(0, last).replace(/[.,']/gu, '')}.${typed.slice(last + 1)}`;
  const what = repeated ? 'more than one decimal mark' : 'both decimal marks';
  return refuse(
    'not a number',
    `“${typed}” has ${what}. Write ${mend} if that is meant.`,
    text.replace(typed, mend),
  );
}

function fromConcise(match: RegExpExecArray): TypedParts | SplitRefusal {
  const [, value, digits = '', exponent = '', unit = ''] = match;
  const hasMark = /[.,]/u.test(digits);
  if (exponent === '') return { value: point(value), u: point(digits), lastDigits: !hasMark, unit };
  const places = hasMark ? 0 : (point(value).split('.')[1] ?? '').length;
  const u = hasMark ? point(digits) : `${digits}e-${places}`;
  return { value: point(value) + exponent, u: withExponent(u, exponent), lastDigits: false, unit };
}

function withExponent(text: string, exponent: string): string {
  const [mantissa = '', own = '0'] = text.split('e');
  return `${mantissa}e${Number(own) + Number(exponent.slice(1))}`;
}

function fromPlusMinus(match: RegExpExecArray): TypedParts | SplitRefusal {
  const [, value, first = '', u, second = ''] = match;
  const units = [first.trim(), second.trim()];
  if (units[1] === '%' && units[0] !== '%') {
    const amount = Number(((Number(point(value)) * Number(point(u))) / 100).toPrecision(3));
    const mend = `${point(value)} ± ${Math.abs(amount)}`;
    return refuse('ambiguous text', `Write the uncertainty in the unit of the value: ${mend}.`, mend);
  }
  if (units[0] !== '' && units[1] !== '' && units[0] !== units[1]) {
    const sentence = `${units[0]} and ${units[1]} stand in one number. Write value and uncertainty in one unit.`;
    return refuse('ambiguous text', sentence);
  }
  return {
    value: point(value),
    u: point(u),
    lastDigits: false,
    unit: units[0] === '' ? (units[1] ?? '') : (units[0] ?? ''),
  };
}

function fromTwoNumbers(match: RegExpExecArray): TypedParts | SplitRefusal {
  const [, value = '', u = '', unit = ''] = match;
  if (/^[+-]?\d{1,3}$/u.test(value) && /^\d{3}$/u.test(u)) {
    const sentence = `“${value} ${u}” may be one number or a value with its uncertainty. Write ${value}${u} or ${value} ± ${u}.`;
    return refuse('ambiguous text', sentence, `${value}${u}`);
  }
  return { value: point(value), u: point(u), lastDigits: false, unit };
}

function notANumber(text: string, body: string): SplitRefusal {
  const figures = /-?\d+(?:[.,]\d+)?/u.exec(body);
  const sentence = `“${text}” is not a number. Write it like 44.7, 44.7 ± 0.4 or 447 mm.`;
  return refuse('not a number', sentence, figures === null ? null : point(figures[0]));
}

function point(text: string | undefined): string {
  return (text ?? '').replace(',', '.');
}

function refuse(code: SplitRefusal['code'], sentence: string, mend: string | null = null): SplitRefusal {
  return { code, sentence, mend };
}
