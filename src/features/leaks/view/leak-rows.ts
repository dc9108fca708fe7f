import type { PreparedLeak } from '#shared/leaks/prepared-leak.ts';
import { REPORT_SECTIONS, type SectionName } from '#shared/report/schema/section-type.ts';

/** A leak with the row of the figure that it stands in. */
export interface LeakRow {
  readonly key: string;
  readonly section: SectionName;
  readonly prepared: PreparedLeak;
  /** From 1, downwards. */
  readonly row: number;
}

/** A section's stretch of the wall: its first row and the one after its last. */
export interface WallStretch {
  readonly section: SectionName;
  readonly from: number;
  readonly to: number;
}

/** From the top of the vessel down: what was written last stands highest. */
const FROM_TOP: readonly SectionName[] = REPORT_SECTIONS.map(({ name }) => name).toReversed();

/**
 * Rows of the figure. The list keeps its order, the hardest first; the row says where on the wall a leak has its hole.
 *
 * @param leaks - in the order of the list
 */
export function leakRows(leaks: readonly PreparedLeak[]): {
  readonly rows: readonly LeakRow[];
  readonly wall: readonly WallStretch[];
} {
  const wall: WallStretch[] = [];
  const rowOf = new Map<PreparedLeak, number>();
  let row = 1;
  for (const section of FROM_TOP) {
    const here = leaks.filter((leak) => sectionOf(leak) === section);
    if (here.length === 0) continue;
    wall.push({ section, from: row, to: row + here.length });
    for (const leak of here) rowOf.set(leak, row++);
  }
  return {
    wall,
    rows: leaks.map((prepared) => ({
      key: keyOf(prepared),
      section: sectionOf(prepared),
      prepared,
      row: rowOf.get(prepared) ?? 0,
    })),
  };
}

export function keyOf(prepared: PreparedLeak): string {
  return prepared.state === 'mended' ? prepared.mark.leak : prepared.leak.id;
}

function sectionOf(prepared: PreparedLeak): SectionName {
  return prepared.state === 'mended' ? prepared.mark.section : prepared.leak.section;
}
