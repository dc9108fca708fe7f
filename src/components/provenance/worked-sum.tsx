import type { ValueReference } from '#shared/evidence/evidence.ts';
import type { ProvenanceTerm } from '#shared/report/provenance.ts';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { classNames } from '#src/lib/class-names.ts';
import { Brace } from './brace.tsx';

interface WorkedSumProps {
  readonly terms: readonly ProvenanceTerm[];
  /** Follows a part further on the same card. */
  readonly onFollow: (ref: ValueReference) => void;
}

/** A value's sum: the outer brace holds value and u, theirs hold what they were made of. Nested lists to a reader. */
export function WorkedSum({ terms, onFollow }: WorkedSumProps) {
  if (terms.length === 0) return null;
  return (
    <div className="mt-2.5 flex items-stretch gap-1.5 text-xs/5 text-ink-2">
      {terms.length > 1 && <Brace />}
      <ul className="grid min-w-0 flex-1 gap-3.5">
        {terms.map((term, i) => (
          <li key={i} className="flex items-center gap-1.5">
            <span className={classNames('flex-none', term.terms.length > 0 && 'min-w-[66px] max-w-[132px]')}>
              <b className="block font-report text-[17px]/[22px] font-medium whitespace-nowrap text-ink">
                {term.value}
              </b>
              <span className="block text-xs/[17px]">
                <SentenceText text={term.words} />
              </span>
            </span>
            {term.terms.length > 0 && (
              <>
                <Brace />
                <Leaves terms={term.terms} onFollow={onFollow} />
              </>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}

const HUES = {
  measured: 'text-water',
  predicted: 'text-copper',
  difference: 'text-leak',
  count: 'text-ink',
} as const;

function Leaves({ terms, onFollow }: WorkedSumProps) {
  return (
    <ul className="min-w-0 flex-1">
      {terms.map((term, i) => (
        <li key={i} className={classNames(term.terms.length > 0 && 'pb-0.5')}>
          <Leaf term={term} onFollow={onFollow} />
          {term.terms.length > 0 && (
            <div className="ml-2 border-l-[1.25px] border-rule pl-2">
              <Leaves terms={term.terms} onFollow={onFollow} />
            </div>
          )}
        </li>
      ))}
    </ul>
  );
}

function Leaf({
  term,
  onFollow,
}: {
  readonly term: ProvenanceTerm;
  readonly onFollow: (ref: ValueReference) => void;
}) {
  const { value, symbol, words, hue, ref } = term;
  const figure = (
    <span
      className={classNames(
        'font-report text-[15px]/5 whitespace-nowrap',
        hue === null ? 'text-ink' : HUES[hue],
      )}
    >
      {symbol !== null && (
        <>
          <QuantitySymbol symbol={symbol} />
          {'\u00A0=\u00A0'}
        </>
      )}
      {value}
    </span>
  );
  return (
    <span className={classNames('gap-x-2', symbol === null ? 'flex flex-wrap' : 'block')}>
      <span className={classNames(symbol === null && 'min-w-[42px]')}>
        {ref === null ? (
          figure
        ) : (
          <button type="button" onClick={() => onFollow(ref)} className="min-h-5 hover:underline">
            {figure}
          </button>
        )}
      </span>
      {words !== '' && (
        <span className={classNames('text-xs/5', symbol === null ? 'min-w-0 flex-1' : 'ml-2')}>
          <SentenceText text={words} />
        </span>
      )}
    </span>
  );
}
