import { Link } from 'react-router-dom';
import type { MovedValue, MovedVerdict } from '#shared/editions/edition-comparison.ts';
import { Arrow } from '#src/components/arrow.tsx';
import { liveValueClass } from '#src/components/live-value-text.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { VerdictMark } from '#src/components/verdict.tsx';
import { useSymbols } from '../view/use-symbols.ts';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';

const LINE =
  'flex flex-wrap items-center gap-x-2.5 gap-y-0.5 border-t border-hair py-1.5 text-sm first:border-t-0';
const WHY = 'ml-auto text-xs text-ink-2 max-sm:ml-0 max-sm:w-full';

/** A number that moved: what it read, what it reads, what it is and why. */
export function MovedValueLine({
  address,
  moved,
}: {
  readonly address: ProblemAddress;
  readonly moved: MovedValue;
}) {
  const { before, after, hue, name, why, section } = moved;
  return (
    <li className={LINE}>
      <span className="inline-flex flex-wrap items-center gap-2 font-semibold">
        <del className="font-normal text-ink-3">{before}</del>
        <Arrow />
        <Link className={liveValueClass(hue, 'fresh', false)} to={paths.report(address, section)}>
          {after}
        </Link>
      </span>
      <span className={WHY}>{[name, why].filter((part) => part !== '').join(', ')}</span>
    </li>
  );
}

/** A claim whose verdict moved. */
export function MovedVerdictLine({
  address,
  moved,
}: {
  readonly address: ProblemAddress;
  readonly moved: MovedVerdict;
}) {
  const { n, before, after, short, text } = moved;
  return (
    <li className={LINE}>
      <span className="inline-flex flex-wrap items-center gap-2">
        <Link
          className="mr-1 font-semibold underline decoration-edge decoration-[1.25px] underline-offset-4 hover:decoration-ink"
          to={paths.claims(address, n)}
          title={text}
        >
          Claim {n}
        </Link>
        <VerdictMark verdict={before} size={18} />
        <Arrow />
        <VerdictMark verdict={after} size={18} />
      </span>
      <span className={WHY}>
        <SentenceText text={short} />
      </span>
    </li>
  );
}

/** A sentence of what moved besides. */
export function MovedSentence({ sentence }: { readonly sentence: string }) {
  const symbols = useSymbols();
  return (
    <li className={LINE}>
      <span>
        <SentenceText text={sentence} symbols={symbols} />
      </span>
    </li>
  );
}
