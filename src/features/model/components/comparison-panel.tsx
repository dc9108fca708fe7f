import { useState } from 'react';
import type { Chart, Comparison, Evidence, Model } from '#shared/evidence/evidence.ts';
import { chartSentence } from '#shared/report/charts/chart-sentence.ts';
import { Button } from '#src/components/button.tsx';
import { ComparisonChartView } from '#src/components/charts/comparison-chart-view.tsx';
import { DisagreementKey, MeasuredKey, PredictedKey } from '#src/components/legend-keys.tsx';
import { Menu } from '#src/components/menu.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useDefinition } from '#src/lib/evidence/use-definition.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';

interface ComparisonPanelProps {
  readonly model: Model;
  readonly comparison: Comparison | null;
  readonly onChoose: (comparison: string) => void;
  readonly onChooseModel: (n: number) => void;
  readonly onNew: () => void;
  readonly onChange: (comparison: Comparison) => void;
}

/** One series against one model: a sentence, then the chart. */
export function ComparisonPanel({
  model,
  comparison,
  onChoose,
  onChooseModel,
  onNew,
  onChange,
}: ComparisonPanelProps) {
  const { evidence, findings } = useFindingsSnapshot();
  const { mayWrite } = useProblem();
  const here = evidence.comparisons.filter(({ model: of }) => of === model.id);
  const chart = comparison ? evidence.charts.find(({ comparison: of }) => of === comparison.id) : undefined;
  const finding = comparison ? findings.comparisons.get(comparison.id) : undefined;
  const drawn = chart ? findings.charts.get(chart.id) : undefined;
  const sentence = chart ? chartSentence(chart, drawn) : finding?.sentence;
  const models = [...evidence.models].sort((a, b) => b.n - a.n);
  return (
    <section className="page-sheet px-7 pt-6 pb-4.5 max-sm:px-4" aria-label="Comparison">
      <header className="mb-2.5 flex flex-wrap items-end gap-x-5 gap-y-2">
        <div>
          <h2 className="font-report text-[24px]/[30px] font-medium">Comparison</h2>
          <p className="text-sm text-ink-2">
            {comparison ? (
              <Menu
                trigger={
                  <Word aria-label={`Compared: ${comparison.name}. Choose another`}>{comparison.name}</Word>
                }
                items={[
                  ...here.map(({ id, name }) => ({ words: name, onSelect: () => onChoose(id) })),
                  ...(mayWrite
                    ? [
                        { words: 'Change this comparison', onSelect: () => onChange(comparison) },
                        { words: 'New comparison', onSelect: onNew },
                      ]
                    : []),
                ]}
              />
            ) : (
              mayWrite && <Word onClick={onNew}>New comparison</Word>
            )}{' '}
            against{' '}
            <Menu
              trigger={<Word aria-label={`model ${model.n}. Choose another`}>model {model.n}</Word>}
              items={models.map(({ n, name }) => ({
                words: `model ${n}${name ? `, ${name}` : ''}`,
                onSelect: () => onChooseModel(n),
              }))}
            />
          </p>
        </div>
        <div className="ml-auto flex flex-wrap gap-x-4.5 gap-y-1 text-xs max-sm:ml-0">
          <MeasuredKey />
          <PredictedKey />
          <DisagreementKey words={`beyond ${evidence.settings.k} u`} />
        </div>
      </header>
      {!comparison && (
        <p className="font-report text-ink-3 italic">
          Nothing is compared yet: choose the trials that this model must stand up to.
        </p>
      )}
      {finding?.fault && <Notice title="This comparison gives nothing.">{finding.fault.sentence}</Notice>}
      {sentence && !finding?.fault && (
        <p className="mt-0.5 mb-3 max-w-[790px] font-report text-[17px]/[26px] text-pretty">
          <SentenceText text={sentence} />
        </p>
      )}
      {chart && drawn && !finding?.fault && <ComparisonChartView chart={chart} finding={drawn} />}
      {comparison && !chart && !finding?.fault && mayWrite && (
        <DrawChart comparison={comparison} evidence={evidence} />
      )}
    </section>
  );
}

/** A comparison without a chart: ask what stands on the horizontal axis, and draw it. */
function DrawChart({
  comparison,
  evidence,
}: {
  readonly comparison: Comparison;
  readonly evidence: Evidence;
}) {
  const { create } = useDefinition('charts');
  const choices = axisChoices(comparison, evidence);
  const [x, setX] = useState(choices[0]?.value ?? '');
  const draw = async () => {
    const row: Omit<Chart, 'id' | 'n'> = { comparison: comparison.id, x, sentence: '' };
    try {
      await create(row);
      say('The chart is drawn; it can be put into the report.');
    } catch (error) {
      say(sentenceOf(error));
    }
  };
  if (choices.length === 0)
    return (
      <p className="font-report text-ink-3 italic">
        Nothing varies in these trials, so there is no axis to draw along.
      </p>
    );
  return (
    <div className="flex flex-wrap items-end gap-3 border-t border-hair pt-4">
      <Select
        label="Draw it along"
        options={choices}
        value={x}
        onChange={(event) => setX(event.target.value)}
      />
      <Button onClick={() => void draw()}>Draw chart</Button>
    </div>
  );
}

function axisChoices(comparison: Comparison, evidence: Evidence): { value: string; words: string }[] {
  const settings = new Set(
    evidence.series
      .filter(({ id }) => comparison.selection.series.includes(id))
      .flatMap((series) => series.settings),
  );
  return evidence.quantities.flatMap(({ id, name }) =>
    settings.has(id) ? [{ value: id, words: name }] : [],
  );
}
