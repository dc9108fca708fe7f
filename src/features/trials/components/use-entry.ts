import { useState } from 'react';
import { changeTrial } from '#shared/contracts/evidence.ts';
import type { Reading, Series } from '#shared/evidence/evidence.ts';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { useEvidenceCall } from '#src/lib/evidence/use-evidence-call.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { say } from '#src/lib/sill-store.ts';
import { deviation } from '../view/deviation.ts';
import type { SeriesView, TrialLine } from '../view/series-view.ts';
import { useLogTrials } from './use-log-trials.ts';

interface Refusal {
  readonly sentence: string;
  readonly fields: Readonly<Record<string, string>>;
}

/** Logs what stands in the entry bar, or keeps a correction, and says what it did. */
export function useEntry({
  series,
  view,
  correcting,
  onCorrected,
  onLogged,
}: {
  readonly series: Series;
  readonly view: SeriesView;
  readonly correcting: TrialLine | null;
  readonly onCorrected: () => void;
  readonly onLogged: () => void;
}) {
  const { evidence, findings } = useFindingsSnapshot();
  const send = useEvidenceCall();
  const { log, withdraw, waiting, isSending } = useLogTrials();
  const [refusal, setRefusal] = useState<Refusal | null>(null);

  async function submit(values: Readonly<Record<string, Reading>>): Promise<void> {
    setRefusal(null);
    if (correcting) return correct(correcting, values);
    const outcome = await log(series.id, [{ id: crypto.randomUUID(), values, at: new Date().toISOString() }]);
    if (outcome.status === 'refused') {
      setRefusal({ sentence: outcome.sentence, fields: byQuantity(outcome.fields) });
      return;
    }
    if (outcome.status === 'logged') {
      const [trial] = outcome.trials;
      const effect = deviation(evidence, findings, series, view, values)?.sentence ?? '';
      const name = `${series.letter}${trial?.number ?? ''}`;
      say(`${name} logged. ${effect}`.trim(), { words: 'Undo', run: () => withdraw(outcome.trials) });
    }
    onLogged();
  }

  async function correct(line: TrialLine, values: Readonly<Record<string, Reading>>): Promise<void> {
    try {
      await send(changeTrial, {
        params: { trial: line.trial.id },
        body: { change: { kind: 'correct', values: { ...values } } },
      });
      say(`${line.name} is corrected; the log keeps what it said before.`);
      onCorrected();
    } catch (error) {
      setRefusal({
        sentence: sentenceOf(error),
        fields: error instanceof ApiError ? byQuantity(error.fields) : {},
      });
    }
  }

  return { submit, refusal, isSending, waiting: waiting.length };
}

/** `trials.0.values.q-r.text` → `q-r`: the server names the place in the body, the bar knows quantities. */
function byQuantity(fields: Readonly<Record<string, string>>): Record<string, string> {
  return Object.fromEntries(
    Object.entries(fields).map(([path, sentence]) => [path.match(/values\.([^.]+)/)?.[1] ?? path, sentence]),
  );
}
