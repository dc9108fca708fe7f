import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { Choice, ChoiceGroup } from '#src/components/choice-group.tsx';
import { Field } from '#src/components/field.tsx';
import type { SettingsValues } from './problem-form.ts';

interface JudgingFieldsProps {
  readonly register: UseFormRegister<SettingsValues>;
  readonly errors: FieldErrors<SettingsValues>;
}

/** k, level, rounding and paper. A change of k is printed beside every verdict. */
export function JudgingFields({ register, errors }: JudgingFieldsProps) {
  return (
    <>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          label={
            <>
              Margin <span className="sym">k</span> of every verdict
            </>
          }
          inputMode="decimal"
          unit={<i>u</i>}
          hint="A claim holds while measured and predicted differ by no more than this. Bars are drawn as wide."
          error={errors.k?.message}
          {...register('k')}
        />
        <Field
          label="Level of intervals and bands"
          inputMode="decimal"
          unit="%"
          hint="How sure an interval is to hold the value."
          error={errors.level?.message}
          {...register('level')}
        />
      </div>
      <ChoiceGroup legend="Digits of an uncertainty">
        <Choice kind="radio" words="two" value="two digits" {...register('rounding')} />
        <Choice
          kind="radio"
          words="one, and two where the first is 1"
          value="one or two digits"
          {...register('rounding')}
        />
      </ChoiceGroup>
      <ChoiceGroup legend="Paper">
        <Choice kind="radio" words="A4" value="A4" {...register('paper')} />
        <Choice kind="radio" words="Letter" value="Letter" {...register('paper')} />
      </ChoiceGroup>
    </>
  );
}
