import { useState, type ReactNode } from 'react';
import type { ValueReference } from '#shared/evidence/evidence.ts';
import { keyOf } from '#shared/evidence/keys.ts';
import { provenanceOf } from '#shared/report/provenance.ts';
import { Katex } from '#src/components/katex.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { classNames } from '#src/lib/class-names.ts';
import { dayAndMonth, timeOfDay } from '#src/lib/dates/say-date.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { ScalePlot } from './scale-plot.tsx';
import { wayLink } from './way-link.ts';
import { WorkedSum } from './worked-sum.tsx';

const HUES = {
  measured: 'text-water',
  predicted: 'text-copper',
  difference: 'text-leak',
  count: 'text-ink',
} as const;

export interface ProvenanceBodyProps {
  readonly reference: ValueReference;
  readonly unit?: string | null;
  /** Where else it stands, in a sentence; null or absent: nothing is said. */
  readonly standsIn?: string | null;
  /** What can be done with it here, at the foot. */
  readonly children?: ReactNode;
}

/** What a provenance card says, the same on a page, on a chart and on a phone. */
export function ProvenanceBody({ reference, unit = null, standsIn = null, children }: ProvenanceBodyProps) {
  const { evidence, findings } = useFindingsSnapshot();
  const { address, frozen } = useProblem();
  const [trail, setTrail] = useState<readonly ValueReference[]>([]);
  const current = trail.at(-1) ?? reference;
  const card = provenanceOf(current, evidence, findings, trail.length === 0 ? unit : null);
  const since = useFreshSince(keyOf(current) + card.shown.text);
  const link = card.way === null || frozen ? null : wayLink(card.way, address, evidence);
  const sentences = [card.leftOut, trail.length === 0 ? standsIn : null].filter((s) => s !== null);
  return (
    <div>
      <div className="flex items-baseline justify-between gap-3">
        <strong className={classNames('font-report text-[28px]/8 font-medium', HUES[card.shown.hue])}>
          {card.shown.value}
        </strong>
        <span className="text-right text-xs text-ink-2">
          {card.kind}
          {typeof card.shown.scalar?.u === 'number' && (
            <>
              , <i className="font-report">k</i> = 1
            </>
          )}
        </span>
      </div>
      {card.formula !== null && (
        <Katex latex={card.formula} display className="mt-2 block overflow-x-auto py-1" />
      )}
      <WorkedSum terms={card.terms} onFollow={(ref) => setTrail([...trail, ref])} />
      {card.plot && <ScalePlot plot={card.plot} />}
      {(sentences.length > 0 || card.notes.length > 0) && (
        <div className="mt-2.5 border-t border-hair pt-2 font-report text-[14px]/5 text-ink-2 max-sm:text-[15px]/[21px]">
          {card.notes.map((note) => (
            <p key={note}>
              <SentenceText text={note} />
            </p>
          ))}
          {sentences.length > 0 && (
            <p>
              <SentenceText text={sentences.join(' ')} />
            </p>
          )}
        </div>
      )}
      <div className="mt-1.5 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1 text-xs/5 text-ink-3">
        {trail.length > 0 ? (
          <Word onClick={() => setTrail(trail.slice(0, -1))}>Back</Word>
        ) : (
          <span>
            {card.shown.state !== 'fresh'
              ? 'Nothing to show'
              : frozen
                ? `As frozen on ${dayAndMonth(frozen.at)}`
                : `Fresh at ${since}`}
          </span>
        )}
        {link && <WordLink to={link.to}>{link.words}</WordLink>}
      </div>
      {trail.length === 0 && children}
    </div>
  );
}

/** The time since which the card shows what it shows: it follows the trials, so that is when it opened or moved. */
function useFreshSince(shown: string): string {
  const [fresh, setFresh] = useState(() => ({ shown, at: new Date() }));
  if (fresh.shown !== shown) setFresh({ shown, at: new Date() });
  return timeOfDay(fresh.at);
}
