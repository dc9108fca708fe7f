import { useState } from 'react';
import type { Claim } from '#shared/evidence/evidence.ts';
import type { ClaimFinding } from '#shared/evidence/findings.ts';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { VerdictMark } from '#src/components/verdict.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { dayAndMonth } from '#src/lib/dates/say-date.ts';
import { useEvidence, useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { paths } from '#src/lib/paths.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { sayList } from '#src/lib/say/say-list.ts';
import { countInWords } from '#shared/evidence/words.ts';
import { useStationCup } from '#src/lib/station-cup.ts';
import { ClaimForm } from '../components/claim-form.tsx';
import { ClaimScale } from '../components/claim-scale.tsx';
import { turningSentence } from '../view/turning-sentence.ts';

/** Every claim with what it rests on, its place between its margins, and its verdict. */
export function ClaimSheet() {
  const { evidence, findings } = useFindingsSnapshot();
  const { address, mayWrite } = useProblem();
  const [open, setOpen] = useState<string | 'new' | null>(null);
  useStationCup('claims');
  const close = () => setOpen(null);
  const { claims, settings } = evidence;
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1180px] px-6 pb-16 max-sm:px-0"
    >
      <header className="flex flex-wrap items-end gap-x-6 gap-y-2 max-sm:px-4">
        <div>
          <h1 className="h1">Claims</h1>
          <p className="mt-1 font-report text-[17px]/6.5 text-ink-2">
            {countSentence(claims.flatMap(({ id }) => findings.claims.get(id) ?? []))} A claim holds within{' '}
            {settings.k} <span className="sym">u</span>.
          </p>
        </div>
        <WordLink className="ml-auto text-sm" to={paths.model(address)}>
          Back to the model
        </WordLink>
      </header>
      <section className="page-sheet mt-5 px-9 pt-5 pb-4 max-sm:px-4">
        <div
          className="grid grid-cols-[70px_1fr_290px_110px] border-b-[1.25px] border-ink pb-1.5 text-xs text-ink-2 max-[900px]:hidden"
          aria-hidden="true"
        >
          <span />
          <span>What we say, and what it rests on</span>
          <span className="text-center">
            measured – predicted, in <span className="sym">u</span>
          </span>
          <span>Verdict</span>
        </div>
        <ol>
          {claims.map((claim) => (
            <li
              key={claim.id}
              id={`claim-${claim.n}`}
              className="scroll-mt-24 border-b border-hair target:bg-measured-wash"
            >
              {open === claim.id ? (
                <ClaimForm id={claim.id} onClose={close} />
              ) : (
                <ClaimRow
                  claim={claim}
                  finding={findings.claims.get(claim.id)}
                  onChange={mayWrite ? () => setOpen(claim.id) : null}
                />
              )}
            </li>
          ))}
        </ol>
        {open === 'new' ? (
          <ClaimForm id={null} onClose={close} />
        ) : (
          <p className="flex flex-wrap items-baseline gap-x-6 py-4 font-report text-lg text-ink-3">
            <span className="w-11">{claims.length + 1}</span>
            <i>a sentence you would defend, and the quantity it is about</i>
            {mayWrite && (
              <Word className="ml-auto font-ui text-sm" onClick={() => setOpen('new')}>
                New claim
              </Word>
            )}
          </p>
        )}
      </section>
      <p className="mt-4 text-sm text-ink-2 max-sm:px-4">
        A test and its margin are set before the trials. Changing them afterwards is allowed, and the day it
        was done is shown.
      </p>
    </main>
  );
}

function ClaimRow({
  claim,
  finding,
  onChange,
}: {
  readonly claim: Claim;
  readonly finding: ClaimFinding | undefined;
  readonly onChange: (() => void) | null;
}) {
  const { settings } = useEvidence();
  const turning = finding ? turningSentence(claim, finding, settings.rounding) : null;
  return (
    <div className="grid grid-cols-[70px_1fr_290px_110px] items-center gap-y-2 py-5 max-[900px]:grid-cols-[40px_minmax(0,1fr)]">
      <span className="self-start font-report text-xl text-ink-3">{claim.n}</span>
      <div className="pr-6">
        <p className="font-report text-lg font-medium">{claim.text}</p>
        <p className="text-sm text-ink-2">{finding && <SentenceText text={finding.sentence} />}</p>
        {turning && <p className="font-report text-[15px]/[22px] text-ink-2">{turning}</p>}
        <p className="mt-1 flex gap-4 text-xs text-ink-3">
          {claim.test ? `Test set on ${dayAndMonth(new Date(claim.declaredAt))}.` : 'No test is chosen yet.'}
          {onChange && (
            <Word aria-label={`Change claim ${claim.n}`} onClick={onChange}>
              Change
            </Word>
          )}
        </p>
      </div>
      <span className="max-[900px]:col-start-2">{finding && <ClaimScale finding={finding} />}</span>
      <span className="max-[900px]:col-start-2">
        {finding && <VerdictMark verdict={finding.verdict} size={27} />}
      </span>
    </div>
  );
}

/** "Two hold, one leaks, one is undecided." */
function countSentence(findings: readonly ClaimFinding[]): string {
  if (findings.length === 0) return 'Nothing is claimed yet.';
  const words = (['Holds', 'Leaks', 'Undecided'] as const).flatMap((verdict) => {
    const count = findings.filter((finding) => finding.verdict === verdict).length;
    if (count === 0) return [];
    const one = count === 1;
    const does = {
      Holds: one ? 'holds' : 'hold',
      Leaks: one ? 'leaks' : 'leak',
      Undecided: one ? 'is undecided' : 'are undecided',
    }[verdict];
    return [`${countInWords(count)} ${does}`];
  });
  const sentence = sayList(words);
  return `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}.`;
}
