import { useState, type ReactNode } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import type { Comparison, Evidence, Model } from '#shared/evidence/evidence.ts';
import { Word } from '#src/components/word.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { paths } from '#src/lib/paths.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useStationCup } from '#src/lib/station-cup.ts';
import { ComparisonForm } from '../components/comparison-form.tsx';
import { ComparisonPanel } from '../components/comparison-panel.tsx';
import { ModelForm } from '../components/model-form.tsx';
import { ModelSheet } from '../components/model-sheet.tsx';

type OpenForm =
  | { readonly kind: 'model'; readonly isNew: boolean }
  | { readonly kind: 'comparison'; readonly id: string | null }
  | null;

/** A model on the left, one series against it on the right, and below it what the team claims. */
export function ModelStation({ claims }: { readonly claims: ReactNode }) {
  const evidence = useEvidence();
  const { address, mayWrite } = useProblem();
  const navigate = useNavigate();
  const { n } = useParams();
  const [form, setForm] = useState<OpenForm>(null);
  const [chosen, choose] = useState<string | null>(null);
  const model = modelAt(n, evidence);
  const comparison = model ? comparisonAt(chosen, model, evidence) : null;
  const toModel = (number: number) => void navigate(paths.model(address, number));
  useStationCup(model ? `model ${model.n}` : 'no model');
  const closeModel = (kept: string | null) => {
    setForm(null);
    const made = evidence.models.find(({ id }) => id === kept);
    if (kept && !made) toModel(1 + Math.max(0, ...evidence.models.map((each) => each.n)));
  };
  const left =
    form?.kind === 'model' ? (
      <ModelForm from={model?.id ?? null} isNew={form.isNew} onClose={closeModel} />
    ) : model ? (
      <ModelSheet
        model={model}
        shown={comparison}
        actions={{
          fitAgain: (fit) => setForm({ kind: 'comparison', id: fit?.id ?? null }),
          addTerm: () => setForm({ kind: 'model', isNew: true }),
          change: () => setForm({ kind: 'model', isNew: false }),
        }}
      />
    ) : (
      <FirstModel onStart={mayWrite ? () => setForm({ kind: 'model', isNew: true }) : null} />
    );
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto grid max-w-[1360px] grid-cols-[minmax(0,472fr)_minmax(0,864fr)] items-start gap-6 pb-15 max-[1440px]:mx-10 max-[1100px]:grid-cols-1 max-sm:mx-0"
    >
      <div className="max-[1100px]:order-2">{left}</div>
      <div className="grid min-w-0 gap-6 max-[1100px]:contents">
        <div className="min-w-0 max-[1100px]:order-1">
          {form?.kind === 'comparison' && model ? (
            <ComparisonForm
              key={form.id ?? 'new'}
              model={model}
              id={form.id}
              onClose={(kept) => {
                setForm(null);
                if (kept) choose(kept);
              }}
            />
          ) : (
            model && (
              <ComparisonPanel
                model={model}
                comparison={comparison}
                onChoose={choose}
                onChooseModel={toModel}
                onNew={() => setForm({ kind: 'comparison', id: null })}
                onChange={({ id }) => setForm({ kind: 'comparison', id })}
              />
            )
          )}
        </div>
        <div className="max-[1100px]:order-3">{claims}</div>
      </div>
    </main>
  );
}

/** The model in the address, else the newest. */
function modelAt(n: string | undefined, { models }: Evidence): Model | null {
  const named = models.find((model) => String(model.n) === n);
  return (
    named ??
    models.reduce<Model | null>((newest, model) => (!newest || model.n > newest.n ? model : newest), null)
  );
}

/** The one chosen; else a prediction with a chart, then any with a chart, then any. */
function comparisonAt(
  chosen: string | null,
  model: Model,
  { comparisons, charts }: Evidence,
): Comparison | null {
  const here = comparisons.filter((comparison) => comparison.model === model.id);
  const hasChart = ({ id }: Comparison) => charts.some((chart) => chart.comparison === id);
  return (
    here.find(({ id }) => id === chosen) ??
    here.find((comparison) => comparison.free.length === 0 && hasChart(comparison)) ??
    here.find(hasChart) ??
    here[0] ??
    null
  );
}

function FirstModel({ onStart }: { readonly onStart: (() => void) | null }) {
  return (
    <section className="page-sheet px-7 py-6.5" aria-label="Model">
      <h1 className="font-report text-[24px]/[30px] font-medium">Model</h1>
      <p className="mt-3 border-t border-hair pt-3 font-report text-ink-3 italic">
        R = …, the quantity you measure, by those you set and know
      </p>
      {onStart && (
        <p className="mt-3 text-sm">
          <Word onClick={onStart}>State a model</Word>
        </p>
      )}
    </section>
  );
}
