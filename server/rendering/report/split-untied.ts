import { untiedNumbers, type SettingNames } from '#shared/report/untied-numbers.ts';

/** A stretch of typed text; an untied one is a number that follows no trial. */
export interface TypedStretch {
  readonly text: string;
  readonly isUntied: boolean;
}

/** Splits typed text at its untied numbers. */
export function splitUntied(text: string, settings: SettingNames): readonly TypedStretch[] {
  const stretches: TypedStretch[] = [];
  let end = 0;
  for (const number of untiedNumbers(text, settings)) {
    stretches.push({ text: text.slice(end, number.from), isUntied: false });
    stretches.push({ text: number.text, isUntied: true });
    end = number.to;
  }
  stretches.push({ text: text.slice(end), isUntied: false });
  return stretches.filter((stretch) => stretch.text !== '');
}
