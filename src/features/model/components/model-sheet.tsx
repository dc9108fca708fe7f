import { useMemo } from 'react';
import type { Comparison, Model } from '#shared/evidence/evidence.ts';
import type { ComparisonFinding, ComparisonPoint } from '#shared/evidence/findings.ts';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { Word } from '#src/components/word.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { trustedSentences } from '../view/trusted-view.ts';
import { settingWords } from '../view/setting-words.ts';
import { BudgetTable } from './budget-table.tsx';
import { EquationList } from './equation-list.tsx';

interface ModelSheetProps {
  readonly model: Model;
  /** The comparison on the right: its settings are what the budget can be read at. */
  readonly shown: Comparison | null;
  readonly actions: {
    readonly fitAgain: (comparison: Comparison | null) => void;
    readonly addTerm: () => void;
    readonly change: () => void;
  };
}

/** A model: its equations, the budget of what it predicts, how its parameters were found, where it is trusted. */
export function ModelSheet({ model, shown, actions }: ModelSheetProps) {
  const { evidence, findings } = useFindingsSnapshot();
  const { mayWrite } = useProblem();
  const output = evidence.quantities.find(({ id }) => id === model.output);
  const fits = evidence.comparisons.filter(({ model: of, free }) => of === model.id && free.length > 0);
  const points = shown ? (findings.comparisons.get(shown.id)?.points ?? []) : [];
  const point = largestPredicted(points);
  const trusted = useMemo(() => trustedSentences(model, evidence), [model, evidence]);
  return (
    <section className="page-sheet px-7 py-6.5 max-sm:px-4" aria-label={`Model ${model.n}`}>
      <h1 className="font-report text-[24px]/[30px] font-medium">Model {model.n}</h1>
      {model.name && <p className="text-sm text-ink-2">{model.name}</p>}
      <EquationList model={model} />
      {output && point?.predicted && (
        <BudgetTable
          output={output}
          model={model}
          point={point}
          predicted={point.predicted}
          where={settingWords(point.settings, shown, evidence)}
        />
      )}
      <h2 className="mt-6 font-report text-[19px]/6.5 font-medium">Fit</h2>
      {fits.length === 0 && (
        <p className="font-report text-[17px]/[26px] text-pretty text-ink-2">
          Nothing is fitted; the model predicts with what is known already.
        </p>
      )}
      {fits.map((fit) => (
        <FitSentence key={fit.id} finding={findings.comparisons.get(fit.id)} />
      ))}
      <h2 className="mt-6 font-report text-[19px]/6.5 font-medium">Trusted</h2>
      <p className="font-report text-[17px]/[26px] text-pretty text-ink-2">{trusted.join(' ')}</p>
      {model.assumptions.length > 0 && (
        <ul className="mt-2 text-sm text-ink-2">
          {model.assumptions.map(({ text }) => (
            <li key={text}>– {text}</li>
          ))}
        </ul>
      )}
      {mayWrite && (
        <p className="mt-4.5 flex flex-wrap gap-x-4.5 gap-y-2 text-sm">
          <Word onClick={() => actions.fitAgain(fits[0] ?? null)}>
            {fits.length > 0 ? 'Fit again' : 'Fit a parameter'}
          </Word>
          <Word onClick={actions.addTerm}>Add a term</Word>
          <Word onClick={actions.change}>Change model {model.n}</Word>
        </p>
      )}
    </section>
  );
}

function FitSentence({ finding }: { readonly finding: ComparisonFinding | undefined }) {
  if (!finding) return null;
  if (finding.fault)
    return (
      <p className="font-report text-[17px]/[26px] text-pretty text-ink-2 text-leak">
        {finding.fault.sentence}
      </p>
    );
  return (
    <>
      <p className="font-report text-[17px]/[26px] text-pretty text-ink-2">
        <SentenceText text={finding.sentence} />
      </p>
      {finding.warnings.map((warning) => (
        <p key={warning} className="mt-1 text-sm text-ink-2">
          <SentenceText text={warning} />
        </p>
      ))}
    </>
  );
}

/** The budget stands at the setting of the largest prediction, where the claim is usually made. */
function largestPredicted(points: readonly ComparisonPoint[]): ComparisonPoint | null {
  return points.reduce<ComparisonPoint | null>(
    (largest, point) =>
      point.predicted &&
      point.trusted &&
      (!largest?.predicted || point.predicted.value > largest.predicted.value)
        ? point
        : largest,
    null,
  );
}
