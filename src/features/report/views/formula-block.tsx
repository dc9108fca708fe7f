import { NodeViewWrapper, type NodeViewProps } from '@tiptap/react';
import { useState } from 'react';
import { equationSteps } from '#shared/report/formula-steps.ts';
import type { FormulaAttributes } from '#shared/report/schema/formula-node.ts';
import { Katex } from '#src/components/katex.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useNumbers } from '../components/report-context.ts';

const STEPS = ['symbols', 'numbers', 'numbers and result'] as const;

/** A formula on its own line; the typed form stands in its place while it is edited. */
export function FormulaBlock({ node, editor, updateAttributes, selected }: NodeViewProps) {
  const attrs = node.attrs as FormulaAttributes;
  const number = useNumbers().formulas.get(attrs.anchor);
  const [isTyping, setIsTyping] = useState(attrs.kind === 'typed' && attrs.latex === '');
  const mayEdit = editor.isEditable;
  return (
    <NodeViewWrapper className="report-formula" id={attrs.anchor} data-selected={selected || undefined}>
      {attrs.kind === 'equation' ? (
        <Equation attrs={attrs} />
      ) : isTyping && mayEdit ? (
        <TypedFormula
          latex={attrs.latex}
          onKeep={(latex) => {
            updateAttributes({ latex });
            setIsTyping(false);
          }}
        />
      ) : mayEdit ? (
        <button
          type="button"
          className="block w-full"
          aria-label="Change this formula"
          onClick={() => setIsTyping(true)}
        >
          <Katex latex={attrs.latex || '\\square'} display />
        </button>
      ) : (
        <Katex latex={attrs.latex} display />
      )}
      {number !== undefined && <span className="report-formula-number">({number})</span>}
      {attrs.kind === 'equation' && mayEdit && selected && (
        <label className="report-formula-steps">
          Shown with{' '}
          <select
            value={attrs.steps}
            onChange={(event) => updateAttributes({ steps: event.target.value })}
            className="h-7 rounded-md border-[1.25px] border-edge bg-paper px-1"
          >
            {STEPS.map((step) => (
              <option key={step}>{step}</option>
            ))}
          </select>
        </label>
      )}
    </NodeViewWrapper>
  );
}

function Equation({ attrs }: { readonly attrs: FormulaAttributes }) {
  const { evidence, findings } = useFindingsSnapshot();
  const { model, defines, series, at, steps } = attrs;
  if (model === null || defines === null)
    return <Notice title="This formula has lost its model.">Put in another from the sill.</Notice>;
  const worked = equationSteps({ model, defines, series, at }, steps, evidence, findings);
  if (!worked.ok) {
    return (
      <>
        {worked.symbols && <Katex latex={worked.symbols} display />}
        <Notice title="The numbers cannot be put in.">{worked.fault.sentence}</Notice>
      </>
    );
  }
  return (
    <div className="report-formula-frame" role="group" aria-label={worked.spoken} tabIndex={0}>
      <Katex latex={worked.symbols} display />
      {worked.numbers && (
        <Katex className="report-formula-worked" latex={worked.numbers} display label={worked.spoken} />
      )}
    </div>
  );
}

function TypedFormula({
  latex,
  onKeep,
}: {
  readonly latex: string;
  readonly onKeep: (latex: string) => void;
}) {
  const [typed, setTyped] = useState(latex);
  return (
    <textarea
      // The formula was just put in or pressed: one writes at once.
      ref={(field) => field?.focus()}
      className="typed-formula block w-full resize-none"
      aria-label="Formula, typed in LaTeX"
      rows={Math.max(1, typed.split('\n').length)}
      spellCheck={false}
      value={typed}
      onChange={(event) => setTyped(event.target.value)}
      onBlur={() => onKeep(typed)}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === 'Escape') onKeep(latex);
        if (event.key === 'Enter' && !event.shiftKey) {
          event.preventDefault();
          onKeep(typed);
        }
      }}
    />
  );
}
