import '../report.css';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useStore } from '#src/lib/store/use-store.ts';
import { OpenReport } from '../components/open-report.tsx';
import type { ReportSlots } from '../components/report-slots.ts';
import { SessionNotice } from '../components/session-notice.tsx';
import type { ReportSession } from '../session/report-session.ts';
import { useReportSession } from '../session/use-report-session.ts';

/** The report: one page that the team writes together, bound to the evidence. */
export function ReportStation(slots: ReportSlots) {
  const { session, error, retry } = useReportSession();
  if (error && !session) {
    return (
      <main id="page" tabIndex={-1} data-region="page" className="page-top mx-auto max-w-[760px] px-6">
        <Notice title="The report could not be opened.">
          {sentenceOf(error)} <Word onClick={retry}>Try again</Word>
        </Notice>
      </main>
    );
  }
  return session ? <Opening key={session.doc.guid} session={session} {...slots} /> : <Waiting />;
}

function Opening({ session, ...slots }: ReportSlots & { readonly session: ReportSession }) {
  const state = useStore(session.state);
  if (state.phase === 'open') return <OpenReport session={session} state={state} {...slots} />;
  if (state.phase === 'opening') return <Waiting />;
  return (
    <main id="page" tabIndex={-1} data-region="page" className="page-top mx-auto max-w-[760px] px-6">
      <SessionNotice state={state} editor={null} />
    </main>
  );
}

function Waiting() {
  return (
    <main id="page" tabIndex={-1} data-region="page" className="page-top mx-auto max-w-[760px] px-6">
      <Loading what="the report" />
    </main>
  );
}
