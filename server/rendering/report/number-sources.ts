import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { keyOf } from '#shared/evidence/keys.ts';
import { showValue, type Shown } from '#shared/report/live-value.ts';

/** A tied number of the report: its letter, and how it reads where it stands first. */
export interface NumberSource {
  readonly letter: string;
  readonly ref: ValueReference;
  readonly shown: Shown;
}

const ALPHABET = 'abcdefghijklmnopqrstuvwxyz';

/**
 * The letter of the n-th number: a to z, then aa, ab and so on.
 *
 * @param index - from 0
 */
export function letterOf(index: number): string {
  const last = ALPHABET.charAt(index % ALPHABET.length);
  const before = Math.floor(index / ALPHABET.length);
  return before === 0 ? last : letterOf(before - 1) + last;
}

/** Gives each tied number of the report a letter, the same wherever the same number stands again. */
export class NumberSources {
  private readonly byKey = new Map<string, NumberSource>();

  constructor(
    private readonly evidence: Evidence,
    private readonly findings: Findings,
  ) {}

  letter(ref: ValueReference): string {
    const key = keyOf(ref);
    const known = this.byKey.get(key);
    if (known) return known.letter;
    const letter = letterOf(this.byKey.size);
    const shown = showValue(ref, 'value', null, this.evidence, this.findings);
    this.byKey.set(key, { letter, ref, shown });
    return letter;
  }

  /** The letter, if the number stands in the report. */
  find(ref: ValueReference): string | null {
    return this.byKey.get(keyOf(ref))?.letter ?? null;
  }

  get all(): readonly NumberSource[] {
    return [...this.byKey.values()];
  }
}
