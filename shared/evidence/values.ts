import type { SourceFreedom } from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import type { Finding, Group } from './findings.ts';
import type { Register } from './register.ts';

/**
 * Where values are looked up: while an evaluation runs, or in its findings afterwards. The same code makes means
 * and predictions from either.
 */
export interface Values {
  readonly register: Register;
  /** Register value, inside a series or outside of all. */
  finding(quantity: string, series: string | null): Finding;
  groups(series: string): readonly Group[];
  freedomOf(source: string): SourceFreedom;
}
