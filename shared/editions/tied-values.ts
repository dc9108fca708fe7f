import { keyOf } from '#shared/evidence/keys.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import type { LiveValueAttributes } from '#shared/report/schema/live-value-node.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { findSection } from '#shared/report/schema/section-type.ts';

/** A value that is tied in a report, with the first place where it stands. */
export interface TiedValue extends Pick<LiveValueAttributes, 'ref' | 'unit'> {
  readonly key: string;
  /** Number of the section, 1 to 5. */
  readonly section: number;
}

/** The values tied in a report, each once for each unit it is shown in, in reading order. */
export function tiedValues(document: ReportDocument): Map<string, TiedValue> {
  const found = new Map<string, TiedValue>();
  for (const section of document.content) {
    const number = findSection(section.type)?.number ?? 0;
    for (const node of nodesOf(section)) {
      if (node.type !== 'liveValue') continue;
      const { ref, unit } = node.attrs;
      const key = tiedKey(node.attrs);
      if (!found.has(key)) found.set(key, { key, ref, unit, section: number });
    }
  }
  return found;
}

/** Equal for what points at the same and is shown in the same unit, in whatever form. */
export function tiedKey({ ref, unit }: Pick<LiveValueAttributes, 'ref' | 'unit'>): string {
  return unit === null ? keyOf(ref) : `${keyOf(ref)} in ${unit}`;
}
