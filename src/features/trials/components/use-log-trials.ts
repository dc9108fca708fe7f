import { useCallback, useEffect, useMemo, useState } from 'react';
import { logTrials, changeTrial, type NewTrial } from '#shared/contracts/evidence.ts';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import type { Trial } from '#shared/evidence/evidence.ts';
import { ApiError, NOT_REACHED, sentenceOf } from '#src/lib/api/api-error.ts';
import { useEvidenceCall } from '#src/lib/evidence/use-evidence-call.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';
import { useStore } from '#src/lib/store/use-store.ts';
import { createOutbox } from '../outbox.ts';

const AGAIN_AFTER_MS = 4000;

/** How a logging ended: logged, kept here until the server is back, or refused with sentences for the fields. */
export type LogOutcome =
  | { readonly status: 'logged'; readonly trials: readonly Trial[] }
  | { readonly status: 'waiting' }
  | {
      readonly status: 'refused';
      readonly sentence: string;
      readonly fields: Readonly<Record<string, string>>;
    };

/** Logs trials; what cannot be sent waits in the browser and is sent by itself when the server is back. */
export function useLogTrials() {
  const send = useEvidenceCall();
  const { address } = useProblem();
  const outbox = useMemo(
    () => createOutbox(`trials not sent ${address.team} ${address.number}`, window.localStorage),
    [address],
  );
  const waiting = useStore(outbox);
  const [isSending, setIsSending] = useState(false);

  const withdraw = useCallback(
    (trials: readonly Trial[]) => {
      for (const trial of trials) {
        void send(changeTrial, { params: { trial: trial.id }, body: { change: { kind: 'withdraw' } } }).then(
          () => say('Taken back.'),
          (error: unknown) => say(sentenceOf(error)),
        );
      }
    },
    [send],
  );

  const log = useCallback(
    async (series: string, trials: readonly NewTrial[]): Promise<LogOutcome> => {
      setIsSending(true);
      try {
        const step = await send(logTrials, { params: { series }, body: { trials: [...trials] } });
        return { status: 'logged', trials: trialsOf(step) };
      } catch (error) {
        if (error instanceof ApiError && error.code === NOT_REACHED) {
          for (const trial of trials) outbox.add({ series, trial });
          return { status: 'waiting' };
        }
        return {
          status: 'refused',
          sentence: sentenceOf(error),
          fields: error instanceof ApiError ? error.fields : {},
        };
      } finally {
        setIsSending(false);
      }
    },
    [send, outbox],
  );

  useEffect(() => {
    if (waiting.length === 0) return;
    const sendNext = async () => {
      const [next] = outbox.get();
      if (!next) return;
      const outcome = await log(next.series, [next.trial]);
      if (outcome.status !== 'waiting') outbox.remove(next.trial.id);
      if (outcome.status === 'refused') say(`One trial that waited here was refused: ${outcome.sentence}`);
    };
    const timer = setInterval(() => void sendNext(), AGAIN_AFTER_MS);
    const onOnline = () => void sendNext();
    window.addEventListener('online', onOnline);
    return () => {
      clearInterval(timer);
      window.removeEventListener('online', onOnline);
    };
  }, [waiting.length, outbox, log]);

  return { log, withdraw, waiting, isSending };
}

function trialsOf({ changes }: EvidenceStep): Trial[] {
  return changes.flatMap((change) => (change.table === 'trials' ? [change.row] : []));
}
