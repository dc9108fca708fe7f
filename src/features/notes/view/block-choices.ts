import type { Evidence } from '#shared/evidence/evidence.ts';
import { blockNumbers } from '#shared/report/block-numbers.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import type { ReportDocument, ReportNode } from '#shared/report/schema/report-node.ts';
import { findSection, type SectionName } from '#shared/report/schema/section-type.ts';

/** A block that a note can be about, with the words by which people know it. */
export interface BlockChoice {
  readonly section: SectionName;
  readonly anchor: string;
  readonly words: string;
}

/** Every formula, figure, table, claim and plate, in the order in which they stand. */
export function blockChoices(document: ReportDocument, evidence: Evidence): readonly BlockChoice[] {
  const numbers = blockNumbers(document);
  const wordsOf = (node: ReportNode): { anchor: string; words: string } | null => {
    switch (node.type) {
      case 'formula': {
        const n = numbers.formulas.get(node.attrs.anchor);
        return {
          anchor: node.attrs.anchor,
          words: n === undefined ? 'Formula without a number' : `Formula (${n})`,
        };
      }
      case 'chart':
        return { anchor: node.attrs.anchor, words: `Figure ${numbers.figures.get(node.attrs.anchor) ?? ''}` };
      case 'trialsTable':
        return { anchor: node.attrs.anchor, words: `Table ${numbers.tables.get(node.attrs.anchor) ?? ''}` };
      case 'plate':
        return { anchor: node.attrs.anchor, words: `Plate ${numbers.plates.get(node.attrs.anchor) ?? ''}` };
      case 'claim': {
        const claim = evidence.claims.find(({ id }) => id === node.attrs.claim);
        return claim ? { anchor: node.attrs.anchor, words: `Claim ${claim.n}` } : null;
      }
      default:
        return null;
    }
  };
  return document.content.flatMap((part) => {
    const section = findSection(part.type)?.name;
    if (!section) return [];
    return [...nodesOf(part)].flatMap((node) => {
      const found = wordsOf(node);
      return found ? [{ section, ...found }] : [];
    });
  });
}
