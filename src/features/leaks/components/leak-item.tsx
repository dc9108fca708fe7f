import type { PreparedLeak } from '#shared/leaks/prepared-leak.ts';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { WordLink } from '#src/components/word.tsx';
import { classNames } from '#src/lib/class-names.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { placeLink } from '../view/place-link.ts';
import type { LeakRow } from '../view/leak-rows.ts';
import { AnswerLines } from './answer-lines.tsx';
import { Jet, reachOf } from './jet.tsx';
import { Plug } from './plug.tsx';

interface LeakItemProps {
  readonly leak: LeakRow;
  /** Brought forward; 'back' while another one is. */
  readonly stands: 'forward' | 'back' | 'with the others';
  readonly onPress: () => void;
}

/** A question where its water lands, its evidence, and our answer beneath. */
export function LeakItem({ leak: { prepared, row }, stands, onPress }: LeakItemProps) {
  const pressure = prepared.state === 'mended' ? 0 : prepared.leak.pressure;
  return (
    <li
      style={{
        gridRow: row,
        ['--reach' as string]: prepared.state === 'mended' ? '3%' : `${reachOf(pressure)}%`,
      }}
      className={classNames(
        'relative col-start-3 min-h-[108px] pb-6 transition-opacity duration-120',
        stands === 'back' && 'opacity-40',
      )}
    >
      <span aria-hidden="true" className="absolute top-[14px] -left-[3px] z-[1] h-[13px] w-1 bg-paper" />
      {prepared.state === 'mended' ? (
        <>
          <Plug />
          <p className="absolute top-2.5 left-6 font-report text-[16px] text-ink-2 italic max-sm:static max-sm:pl-6">
            mended
          </p>
        </>
      ) : (
        <>
          <p
            className={classNames(
              'absolute -top-1.5 left-4 font-report text-[16px] italic',
              prepared.state === 'answered' ? 'text-ink-2' : 'text-leak',
            )}
          >
            {prepared.leak.force}
          </p>
          <Jet pressure={pressure} isAnswered={prepared.state === 'answered'} onPress={onPress} />
        </>
      )}
      <div
        className={classNames(
          'ml-[calc(var(--reach)+32px)] max-w-[760px] max-sm:ml-4',
          prepared.state === 'mended' ? 'pt-2 sm:ml-[92px]' : 'pt-11 max-sm:pt-[84px]',
        )}
      >
        <LeakText prepared={prepared} isForward={stands === 'forward'} onPress={onPress} />
      </div>
    </li>
  );
}

interface LeakTextProps {
  readonly prepared: PreparedLeak;
  readonly isForward: boolean;
  readonly onPress: () => void;
}

function LeakText({ prepared, isForward, onPress }: LeakTextProps) {
  const evidence = useEvidence();
  const { address } = useProblem();
  const symbols = evidence.quantities.map(({ symbol }) => symbol);
  const said = prepared.state === 'mended' ? prepared.mark : prepared.leak;
  const isMended = prepared.state === 'mended';
  return (
    <>
      <button
        type="button"
        aria-pressed={isForward}
        onClick={onPress}
        className={classNames(
          'block text-left font-report text-lg font-medium text-balance',
          isMended && 'text-ink-3',
        )}
      >
        <SentenceText text={said.question} symbols={symbols} />
      </button>
      <div className={classNames('mt-0.5 text-base', isMended ? 'text-ink-3' : 'text-ink-2')}>
        {said.name}. <SentenceText text={said.evidence} symbols={symbols} />{' '}
        {prepared.state === 'mended' ? (
          <span className="sr-only">Mended: it is not found any more.</span>
        ) : (
          <>
            {isForward && (
              <>
                <span className="font-medium text-ink">To mend it:</span> {prepared.leak.mend}{' '}
              </>
            )}
            <WordLink to={placeLink(prepared.leak.place, address, evidence)} className="ml-1 text-sm">
              Show
              <span className="sr-only">: {said.question}</span>
            </WordLink>{' '}
            <AnswerLines
              leak={prepared.leak.id}
              question={prepared.leak.question}
              answer={prepared.answer}
              isStale={prepared.isStale}
            />
          </>
        )}
      </div>
    </>
  );
}
