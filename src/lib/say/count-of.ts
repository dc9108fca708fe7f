const SMALL = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** Numbers up to twelve as words, as in "two numbers". */
export function sayNumber(n: number): string {
  return SMALL[n] ?? String(n);
}

/** "1 trial", "31 trials" */
export function countOf(n: number, one: string, many = `${one}s`): string {
  return `${n} ${n === 1 ? one : many}`;
}
