import katex from 'katex';

/** A node of KaTeX's box tree, as far as it is read here. */
export interface KatexNode {
  readonly classes?: readonly string[];
  readonly style?: Readonly<Record<string, string | undefined>>;
  readonly children?: readonly KatexNode[];
  /** Only symbols have text and an italic correction, in ems. */
  readonly text?: string;
  readonly italic?: number;
  /** Height and depth that KaTeX computed, in ems of the formula. */
  readonly height: number;
  readonly depth: number;
  /** Only the elements of a drawing have attributes. */
  readonly attributes?: Readonly<Record<string, string | undefined>>;
  readonly pathName?: string;
  toMarkup(): string;
}

/** The unbreakable pieces of a formula, or KaTeX's reason why there are none. */
export type FormulaTree =
  | { readonly ok: true; readonly bases: readonly KatexNode[] }
  | { readonly ok: false; readonly reason: string };

const PUT_IN_CLASSES = new Set(['fm', 'fp']);

interface KatexInternals {
  __renderToDomTree(latex: string, options: katex.KatexOptions): KatexNode;
}

/** Options of every formula; the same limits as on screen. */
const OPTIONS: katex.KatexOptions = {
  output: 'html',
  throwOnError: true,
  strict: 'ignore',
  maxExpand: 1000,
  maxSize: 50,
  trust: (context) => context.command === '\\htmlClass' && PUT_IN_CLASSES.has(context.class),
};

/** Builds KaTeX's box tree of a formula. */
export function formulaTree(latex: string, display: boolean): FormulaTree {
  try {
    const internals = katex as unknown as KatexInternals;
    const root = internals.__renderToDomTree(latex, { ...OPTIONS, displayMode: display });
    const html = findByClass(root, 'katex-html');
    const bases = html?.children?.filter((child) => child.classes?.includes('katex-base')) ?? [];
    return { ok: true, bases };
  } catch (error) {
    return { ok: false, reason: error instanceof Error ? error.message : String(error) };
  }
}

function findByClass(node: KatexNode, name: string): KatexNode | null {
  if (node.classes?.includes(name)) return node;
  for (const child of node.children ?? []) {
    const found = findByClass(child, name);
    if (found) return found;
  }
  return null;
}
