import type { Editor } from '@tiptap/core';
import { useMemo, useRef, useState } from 'react';
import { getCopyFile, type OpenCopy } from '#shared/contracts/copies.ts';
import { evidenceOfCopy, findingsOfCopy } from '#shared/editions/read-copy-view.ts';
import { REPORT_SECTIONS } from '#shared/report/schema/section-type.ts';
import { CopyBar } from '#src/features/copy/bar/copy-bar.tsx';
import { CopyTitle } from '#src/features/copy/bar/copy-title.tsx';
import { QuestionRoom } from '#src/features/copy/channel/question-room.tsx';
import { AskedPassages } from '#src/features/copy/passages/asked-passages.ts';
import { reportParts } from '#src/features/copy/passages/report-parts.ts';
import { readWords, useReadShares } from '#src/features/copy/passages/use-read-shares.ts';
import { FrozenReport } from '#src/features/report/components/frozen-report.tsx';
import { FrozenTrials } from '#src/features/report/components/frozen-trials.tsx';
import { addressOf } from '#src/lib/api/address-of.ts';
import { createFrozenFindings } from '#src/lib/findings/frozen-findings.ts';
import { ProblemContext, type OpenProblem } from '#src/lib/problem/problem-context.ts';
import { useHeight } from '#src/lib/use-height.ts';
import { useTitle } from '#src/lib/use-title.ts';

interface OpenCopyPageProps {
  readonly copy: OpenCopy;
  /** null: the captain looks at what the reader will see. */
  readonly token: string | null;
  /** Where a picture of the report comes from; without it, from the copy. */
  readonly addressOfPicture?: (sha: string) => string;
}

const EXTENSIONS = [AskedPassages];

/** A copy that is open: the frozen report and all its provenance, and the reader's own questions at the foot. */
export function OpenCopyPage({ copy, token, addressOfPicture }: OpenCopyPageProps) {
  const { view, recipient } = copy;
  const [editor, setEditor] = useState<Editor | null>(null);
  const [footRef, foot] = useHeight(0);
  const page = useRef<HTMLElement>(null);
  const open = useMemo(() => openProblem(copy, token, addressOfPicture), [copy, token, addressOfPicture]);
  const evidence = open.store.get()?.evidence;
  const parts = useMemo(
    () => (evidence ? reportParts(view.document, evidence) : []),
    [view.document, evidence],
  );
  const name = `copy ${view.edition.seal.slice(0, 12)} ${copy.number}`;
  const shares = useReadShares(page, `read ${name}`, foot);
  useTitle(view.problem.title, `lent by ${view.team.name}`);
  return (
    <ProblemContext value={open}>
      <CopyBar copy={copy} token={token} />
      <main
        id="page"
        tabIndex={-1}
        data-region="page"
        className="report-desk copy-desk copy-hatched"
        style={{ paddingBottom: foot + 40 }}
      >
        <div className="col-start-2 min-w-0">
          <FrozenReport
            name={name}
            document={view.document}
            page={page}
            foot={foot}
            extensions={EXTENSIONS}
            onEditor={setEditor}
            head={<CopyTitle view={view} />}
            sections={REPORT_SECTIONS.map(({ name }, index) => ({
              section: name,
              share: shares[index] ?? 0,
              words: readWords(shares[index] ?? 0),
            }))}
          />
          <FrozenTrials />
        </div>
      </main>
      {copy.mayAsk && token !== null ? (
        <section ref={footRef} className="ask" aria-label="Our questions" data-region="sill">
          <QuestionRoom
            token={token}
            recipient={recipient}
            lender={view.team.name}
            editor={editor}
            parts={parts}
          />
        </section>
      ) : (
        <p ref={footRef} className="ask text-center text-sm text-ink-2">
          {token === null ? `This is what ${recipient} sees.` : 'Your own team lent this copy.'} What its
          readers ask is not for you to see.
        </p>
      )}
    </ProblemContext>
  );
}

/** What the parts that draw a report count on, for one that never changes and leads nowhere else. */
function openProblem(
  { view }: OpenCopy,
  token: string | null,
  addressOfPicture: OpenCopyPageProps['addressOfPicture'],
): OpenProblem {
  const { problem, team, edition } = view;
  const store = createFrozenFindings(evidenceOfCopy(view), findingsOfCopy(view));
  const fromCopy = (sha: string) => addressOf(getCopyFile.path, { token: token ?? '', sha });
  return {
    address: { team: '', number: problem.number },
    team: { ...team, slug: '', people: [], season: { from: '', to: '' }, fights: [] },
    problem: { ...problem, tasks: [], owners: [], settings: view.evidence.settings, rowVersion: 0 },
    role: 'advisor',
    mayWrite: false,
    me: '',
    nextFight: null,
    store,
    frozen: { at: new Date(edition.at), addressOfPicture: addressOfPicture ?? fromCopy },
  };
}
