import type { Evidence } from '#shared/evidence/evidence.ts';
import { symbolToLatex, symbolToText } from '#shared/formatting/symbol.ts';
import { valueQuantity } from '#shared/report/value-symbol.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { findSection, type SectionName } from '#shared/report/schema/section-type.ts';

/** Where a quantity is named. */
export interface QuantityUses {
  /** Times it stands in the report: as a tied value, in a formula, or by its name in the text. */
  readonly mentions: number;
  /** Equations that it enters. */
  readonly equations: number;
  /** The first section that names it. */
  readonly section: SectionName | null;
}

/**
 * Where a quantity is named in the report and in the models.
 *
 * @param id - of the quantity
 * @returns counts, and the first section; all nought for a quantity that is not there
 */
export function usesOfQuantity(id: string, evidence: Evidence, document: ReportDocument): QuantityUses {
  const quantity = evidence.quantities.find((row) => row.id === id);
  if (quantity === undefined) return { mentions: 0, equations: 0, section: null };
  const latex = [symbolToLatex(quantity.symbol), symbolToText(quantity.symbol)];
  const name = quantity.name.toLowerCase();
  const equations = evidence.models
    .flatMap((model) => model.equations)
    .filter(({ expr }) => expr.includes(`{${id}}`)).length;
  let mentions = 0;
  let first: SectionName | null = null;
  for (const section of document.content) {
    for (const node of nodesOf(section)) {
      const isNamed =
        (node.type === 'liveValue' && valueQuantity(node.attrs.ref) === id) ||
        ((node.type === 'inlineFormula' || node.type === 'formula') &&
          namesSymbol(JSON.stringify(node.attrs), latex)) ||
        (node.type === 'text' && node.text.toLowerCase().includes(name));
      if (!isNamed) continue;
      mentions += 1;
      first ??= findSection(section.type)?.name ?? null;
    }
  }
  return { mentions, equations, section: first };
}

/** A symbol counts where no letter touches it, so that the h of `\theta` is none. */
function namesSymbol(attrs: string, symbols: readonly string[]): boolean {
  const text = attrs.replaceAll('\\\\', '\\');
  return symbols.some((symbol) => {
    for (let at = text.indexOf(symbol); at >= 0; at = text.indexOf(symbol, at + 1)) {
      const before = text[at - 1] ?? ' ';
      const after = text[at + symbol.length] ?? ' ';
      if (!/[\p{L}\\]/u.test(before) && !/[\p{L}_]/u.test(after)) return true;
    }
    return false;
  });
}
