import { useMemo } from 'react';
import { changeTrial } from '#shared/contracts/evidence.ts';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useEvidenceCall } from '#src/lib/evidence/use-evidence-call.ts';
import { say } from '#src/lib/sill-store.ts';

/** What can be done with a trial that is logged; each says what happened, with a way back where there is one. */
export function useTrialActions() {
  const send = useEvidenceCall();
  return useMemo(() => {
    const change = async (
      trial: string,
      change: Parameters<typeof send<typeof changeTrial>>[1]['body']['change'],
      done: () => void,
    ) => {
      try {
        await send(changeTrial, { params: { trial }, body: { change } });
        done();
      } catch (error) {
        say(sentenceOf(error));
      }
    };
    const bringBack = (trial: string, name: string) =>
      change(trial, { kind: 'bring back' }, () => say(`${name} is back among the trials that count.`));
    const exclude = (trial: string, name: string, reason: string) =>
      change(trial, { kind: 'exclude', reason }, () =>
        say(`${name} is excluded and still shown.`, {
          words: 'Undo',
          run: () => void bringBack(trial, name),
        }),
      );
    const withdraw = (trial: string, name: string) =>
      change(trial, { kind: 'withdraw' }, () =>
        say(`${name} is withdrawn; its number will not be used again.`),
      );
    return { exclude, bringBack, withdraw };
  }, [send]);
}
