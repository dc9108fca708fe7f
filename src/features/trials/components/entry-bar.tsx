import { useEffect, useImperativeHandle, useMemo, useRef, useState, type Ref } from 'react';
import type { Series } from '#shared/evidence/evidence.ts';
import { Button } from '#src/components/button.tsx';
import { SillSentence } from '#src/components/sill.tsx';
import { Word } from '#src/components/word.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { entryFields, firstText, readEntry, uncertaintyKey, type EntryText } from '../view/next-trial.ts';
import type { SeriesView, TrialLine } from '../view/series-view.ts';
import { EntryField } from './entry-field.tsx';
import { EntrySentence } from './entry-sentence.tsx';
import { useEntry } from './use-entry.ts';

export interface EntryBarHandle {
  /** Puts the caret into the reading. */
  focus(): void;
}

interface EntryBarProps {
  readonly series: Series;
  readonly view: SeriesView;
  /** The trial whose reading is being corrected; null: the next trial is entered. */
  readonly correcting: TrialLine | null;
  readonly onCorrected: () => void;
  readonly onPaste: () => void;
  readonly ref?: Ref<EntryBarHandle>;
}

/** The next trial, always ready: settings stay, the reading is empty and has the caret. */
export function EntryBar({ series, view, correcting, onCorrected, onPaste, ref }: EntryBarProps) {
  const { evidence } = useFindingsSnapshot();
  const fields = useMemo(() => entryFields(series, evidence), [series, evidence]);
  const [text, setText] = useState<EntryText>(() => startText(series, evidence, correcting));
  const [asked, setAsked] = useState(false);
  const reading = useRef<HTMLInputElement>(null);
  const entry = useMemo(() => readEntry(fields, text), [fields, text]);
  const { submit, refusal, isSending, waiting } = useEntry({
    series,
    view,
    correcting,
    onCorrected,
    onLogged: () => {
      setText((before) => withoutReadings(before, series));
      setAsked(false);
      reading.current?.focus();
    },
  });
  useImperativeHandle(ref, () => ({ focus: () => reading.current?.focus() }), []);
  useEffect(() => {
    if (correcting) reading.current?.focus();
  }, [correcting]);
  const change = (key: string, value: string) => setText((before) => ({ ...before, [key]: value }));
  const errorOf = (id: string) =>
    entry.faults[id]?.sentence ??
    refusal?.fields[id] ??
    (asked && entry.missing.includes(id) ? 'Nothing is written here yet.' : undefined);
  return (
    <form
      aria-label={correcting ? `Correct ${correcting.name}` : 'The next trial'}
      data-region="entry bar"
      noValidate
      className="fixed inset-x-0 bottom-0 z-[6] border-t-[1.5px] border-ink bg-paper px-10 py-3 shadow-[0_-10px_30px_-18px_rgb(16_38_45/0.35)] max-lg:px-6 max-sm:static max-sm:px-4"
      onSubmit={(event) => {
        event.preventDefault();
        setAsked(true);
        const isComplete = entry.missing.length === 0 && Object.keys(entry.faults).length === 0;
        if (isComplete) void submit(entry.values);
      }}
    >
      <div className="mx-auto flex max-w-[1360px] items-start gap-3.5 max-lg:flex-wrap">
        <EntryTitle
          series={series}
          correcting={correcting}
          next={nextNumber(series, evidence)}
          onPaste={onPaste}
        />
        {fields.map(({ quantity, kind }) => (
          <EntryField
            key={quantity.id}
            quantity={quantity}
            isReading={kind === 'reading'}
            value={text[quantity.id] ?? ''}
            uncertainty={text[uncertaintyKey(quantity.id)] ?? ''}
            understood={entry.understood[quantity.id]}
            error={errorOf(quantity.id)}
            onChange={(value) => change(quantity.id, value)}
            onUncertainty={(value) => change(uncertaintyKey(quantity.id), value)}
            inputRef={quantity.id === (view.drawn?.id ?? series.readings[0]) ? reading : undefined}
          />
        ))}
        <div className="min-w-40 flex-1 self-center pl-2.5 text-xs leading-[19px] text-ink-2 max-lg:basis-full max-lg:pl-0">
          {refusal && <p className="text-leak">{refusal.sentence}</p>}
          <EntrySentence series={series} view={view} values={entry.values} />
          <SillSentence />
          {waiting > 0 && (
            <p>{countOf(waiting, 'trial')} not sent yet; kept here until the server is back.</p>
          )}
        </div>
        <div className="flex items-center gap-2.5 self-center max-sm:w-full max-sm:flex-col">
          {correcting && <Word onClick={onCorrected}>Leave it as it was</Word>}
          <Button type="submit" kind="main" size="tall" busy={isSending} className="max-sm:w-full">
            {correcting ? 'Keep the correction' : 'Log trial'}
          </Button>
        </div>
      </div>
    </form>
  );
}

function EntryTitle({
  series,
  correcting,
  next,
  onPaste,
}: {
  readonly series: Series;
  readonly correcting: TrialLine | null;
  readonly next: number;
  readonly onPaste: () => void;
}) {
  return (
    <div className="w-36 flex-none self-center text-xs text-ink-2 max-sm:w-full">
      <b className="block font-report text-[22px]/7 font-medium text-ink">
        {correcting ? `Correct ${correcting.name}` : `Trial ${series.letter}${next}`}
      </b>
      series {series.letter}
      {!correcting && (
        <Word className="ml-3" onClick={onPaste}>
          Paste rows
        </Word>
      )}
    </div>
  );
}

/** What number the server will most likely give; it is the server's to give. */
function nextNumber(series: Series, evidence: Parameters<typeof firstText>[1]): number {
  return (
    1 +
    evidence.trials.reduce(
      (most, trial) => (trial.series === series.id ? Math.max(most, trial.number) : most),
      0,
    )
  );
}

function startText(
  series: Series,
  evidence: Parameters<typeof firstText>[1],
  correcting: TrialLine | null,
): EntryText {
  if (!correcting) return firstText(series, evidence);
  const text: Record<string, string> = {};
  for (const [id, reading] of Object.entries(correcting.trial.values)) {
    const unit = evidence.quantities.find((quantity) => quantity.id === id)?.unit;
    text[id] = reading.unit === unit ? reading.text : `${reading.text} ${reading.unit}`;
    text[uncertaintyKey(id)] = reading.u ?? '';
  }
  return text;
}

function withoutReadings(text: EntryText, series: Series): EntryText {
  return { ...text, ...Object.fromEntries(series.readings.map((id) => [id, ''])) };
}
