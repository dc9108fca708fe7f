/** A report as a row of blocks, each a row of tokens, so that two reports can be laid beside each other. */
import { symbolName, registerOf, modelName } from '#shared/evidence/register.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { showValue } from '#shared/report/live-value.ts';
import type {
  FormulaNode,
  InlineNode,
  ReportDocument,
  ReportNode,
} from '#shared/report/schema/report-node.ts';
import { findSection } from '#shared/report/schema/section-type.ts';
import { canonicalJson } from './canonical-json.ts';
import type { ComparedSide } from './compare-editions.ts';
import type { TextPiece } from './edition-comparison.ts';
import { tiedKey } from './tied-values.ts';

/** A word, a tied number, a formula or a part; equal keys mean the same, whatever it reads. */
export interface TextToken {
  readonly key: string;
  readonly kind: TextPiece['kind'];
  /** With the space before it. */
  readonly text: string;
}

/** A paragraph, heading, list item, table row, or a part on its own line. */
export interface TextBlock {
  readonly section: number;
  readonly kind: string;
  readonly key: string;
  readonly tokens: readonly TextToken[];
}

type Shown = Pick<ComparedSide, 'evidence' | 'findings'>;

/** The blocks of a report in reading order; empty ones are left out. */
export function textBlocks({ document, ...shown }: ComparedSide): TextBlock[] {
  return sectionsOf(document).flatMap(({ number, section }) => blocksIn(section, number, shown));
}

function sectionsOf(document: ReportDocument) {
  return document.content.map((section) => ({ number: findSection(section.type)?.number ?? 0, section }));
}

function blocksIn(node: ReportNode, section: number, shown: Shown): TextBlock[] {
  switch (node.type) {
    case 'paragraph':
    case 'heading':
      return block(node.type, section, inlineTokens(node.content ?? [], shown));
    case 'tableRow':
      return block(
        'tableRow',
        section,
        (node.content ?? []).flatMap((cell) => cellTokens(cell, shown)),
      );
    case 'formula':
      return block('formula', section, [formulaToken(node, shown.evidence)]);
    case 'chart':
    case 'trialsTable':
    case 'claim':
    case 'plate':
      return block(node.type, section, partTokens(node, shown.evidence));
    default:
      if (!('content' in node)) return [];
      return (node.content ?? []).flatMap((child: ReportNode) => blocksIn(child, section, shown));
  }
}

function block(kind: string, section: number, tokens: readonly TextToken[]): TextBlock[] {
  if (tokens.length === 0) return [];
  return [{ section, kind, key: `${section} ${kind} ${tokens.map(({ key }) => key).join(' ')}`, tokens }];
}

function cellTokens(cell: ReportNode, shown: Shown): TextToken[] {
  const content = 'content' in cell ? ((cell.content ?? []) as readonly InlineNode[]) : [];
  const tokens = inlineTokens(content, shown);
  return [...tokens, { key: '|', kind: 'text', text: '  ' }];
}

const WORD = /\s*(?:[\p{L}\p{N}]+|[^\s\p{L}\p{N}])/gu;

function inlineTokens(nodes: readonly InlineNode[], shown: Shown): TextToken[] {
  const tokens: TextToken[] = [];
  let space = '';
  for (const node of nodes) {
    if (node.type === 'text') {
      const words = node.text.match(WORD) ?? [];
      tokens.push(...words.map((word, i) => wordToken(i === 0 ? space + word : word)));
      const trailing = /\s*$/u.exec(node.text)?.[0] ?? '';
      space = words.length === 0 ? space + trailing : trailing;
      continue;
    }
    if (node.type === 'hardBreak') {
      space += ' ';
      continue;
    }
    tokens.push(
      node.type === 'liveValue' ? valueToken(node, space, shown) : texToken(node.attrs.latex, space),
    );
    space = '';
  }
  return tokens;
}

function wordToken(text: string): TextToken {
  return { key: text.trim(), kind: 'text', text };
}

function texToken(latex: string, space = ''): TextToken {
  return { key: `$${latex}`, kind: 'formula', text: space + latex };
}

function valueToken(
  { attrs }: Extract<InlineNode, { type: 'liveValue' }>,
  space: string,
  { evidence, findings }: { readonly evidence: Evidence; readonly findings: Findings },
): TextToken {
  const shown = showValue(attrs.ref, attrs.form, attrs.unit, evidence, findings);
  return { key: `#${attrs.form} ${tiedKey(attrs)}`, kind: 'value', text: space + shown.text };
}

function formulaToken({ attrs }: FormulaNode, evidence: Evidence): TextToken {
  if (attrs.kind === 'typed') return texToken(attrs.latex);
  const { anchor: _anchor, label: _label, ...content } = attrs;
  const register = registerOf(evidence);
  const of = symbolName(register, attrs.defines ?? '');
  return {
    key: canonicalJson(content),
    kind: 'part',
    text: `Formula for ${of}, ${modelName(register, attrs.model ?? '')}`,
  };
}

type PartNode = Extract<ReportNode, { type: 'chart' | 'trialsTable' | 'claim' | 'plate' }>;

/** A part by what it shows, then its caption word by word. */
function partTokens(node: PartNode, evidence: Evidence): TextToken[] {
  const caption = 'caption' in node.attrs ? node.attrs.caption : '';
  const words = (caption.match(WORD) ?? []).map((word, i) => wordToken(i === 0 ? `: ${word}` : word));
  return [{ ...namePart(node, evidence), kind: 'part' }, ...words];
}

function namePart(node: PartNode, evidence: Evidence): { readonly key: string; readonly text: string } {
  switch (node.type) {
    case 'chart': {
      const n = evidence.charts.find(({ id }) => id === node.attrs.chart)?.n;
      return {
        key: `chart ${node.attrs.chart}`,
        text: n === undefined ? 'A chart that is gone' : `Chart ${n}`,
      };
    }
    case 'trialsTable': {
      const letter = evidence.series.find(({ id }) => id === node.attrs.series)?.letter;
      return { key: `table ${node.attrs.series}`, text: `Table of series ${letter ?? 'that is gone'}` };
    }
    case 'claim': {
      const claim = evidence.claims.find(({ id }) => id === node.attrs.claim);
      const text = claim === undefined ? 'A claim that is gone' : `Claim ${claim.n}. ${claim.text}`;
      return { key: `claim ${node.attrs.claim} ${claim?.text ?? ''}`, text };
    }
    case 'plate':
      return { key: `plate ${node.attrs.sha}`, text: 'Plate' };
  }
}
