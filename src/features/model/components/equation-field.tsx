import { useWatch, type Control, type FieldErrors, type UseFormRegister } from 'react-hook-form';
import { Field } from '#src/components/field.tsx';
import { Katex } from '#src/components/katex.tsx';
import { Select } from '#src/components/select.tsx';
import { Triangle } from '#src/components/triangle.tsx';
import { Word } from '#src/components/word.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { equationView } from '../view/equation-view.ts';
import type { ModelDraft } from '../view/model-draft.ts';

interface EquationFieldProps {
  readonly index: number;
  readonly control: Control<ModelDraft>;
  readonly register: UseFormRegister<ModelDraft>;
  readonly errors: FieldErrors<ModelDraft>;
  readonly quantities: readonly { readonly value: string; readonly words: string }[];
  readonly onRemove: (() => void) | null;
}

/** One equation: typed, and typeset below as it is understood, with its units checked while one writes. */
export function EquationField({
  index,
  control,
  register,
  errors,
  quantities,
  onRemove,
}: EquationFieldProps) {
  const evidence = useEvidence();
  const typed = useWatch({ control, name: `equations.${index}` });
  const view = typed?.expr.trim() ? equationView(typed.defines, typed.expr, evidence) : null;
  const wrong = errors.equations?.[index];
  return (
    <fieldset className="mt-2.5 border-t border-hair pt-2.5">
      <legend className="sr-only">Equation {index + 1}</legend>
      <div className="grid grid-cols-[130px_1fr] gap-3">
        <Select
          label="Defines"
          options={quantities}
          error={wrong?.defines?.message}
          {...register(`equations.${index}.defines`)}
        />
        <Field
          label="as"
          className="font-code text-sm"
          spellCheck={false}
          autoComplete="off"
          placeholder="H*sin(2*theta)"
          error={wrong?.expr?.message}
          {...register(`equations.${index}.expr`)}
        />
      </div>
      {view?.latex && (
        <p className="relative overflow-x-auto py-2 text-report">
          <Katex latex={view.latex} />
        </p>
      )}
      {view?.latex && view.fault && (
        <p className="flex items-start gap-1.5 text-xs text-leak">
          <Triangle className="mt-px flex-none" />
          {view.fault.sentence}
        </p>
      )}
      {onRemove && (
        <p className="mt-1 text-xs">
          <Word onClick={onRemove}>Remove equation {index + 1}</Word>
        </p>
      )}
    </fieldset>
  );
}
