import { EditorContent, type Editor } from '@tiptap/react';
import { useEffect, useMemo, useRef, useState } from 'react';
import { blockNumbers } from '#shared/report/block-numbers.ts';
import { sectionLevels } from '#shared/report/levels.ts';
import { findSection } from '#shared/report/schema/section-type.ts';
import { standsInSentence } from '#shared/report/stands-in.ts';
import { ProvenanceCard } from '#src/components/provenance/provenance-card.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { levelShare } from '#src/components/level.ts';
import { useHere, useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { firstName } from '#src/lib/say/last-name.ts';
import { useStationCup } from '#src/lib/station-cup.ts';
import { useReportEditor } from '../editor/use-report-editor.ts';
import type { ReportSession, ReportState } from '../session/report-session.ts';
import { ReportPartsContext } from './report-context.ts';
import type { ReportSlots } from './report-slots.ts';
import { ReportSill } from './report-sill.tsx';
import { SectionVessels } from './section-vessels.tsx';
import { SessionNotice } from './session-notice.tsx';
import { TieList } from './tie-list.tsx';
import { TitleBlock } from './title-block.tsx';
import { useOpenCard } from './use-open-card.ts';
import { useReportDocument } from './use-report-document.ts';

/** The page, its vessels, its margin and its sill. */
export function OpenReport({
  session,
  state,
  extensions,
  Margin,
}: ReportSlots & {
  readonly session: ReportSession;
  readonly state: ReportState;
}) {
  const { problem, team, mayWrite } = useProblem();
  const { evidence, findings } = useFindingsSnapshot();
  const page = useRef<HTMLElement>(null);
  const { card, openReference, close } = useOpenCard(page);
  const readOnly = state.readOnly || !mayWrite;
  const editor = useReportEditor(
    session,
    readOnly,
    ({ attrs, element, byKey }) => openReference(attrs.ref, element, byKey, attrs.unit),
    extensions,
  );
  const document = useReportDocument(editor);
  const parts = useMemo(
    () => ({ numbers: blockNumbers(document), openReference }),
    [document, openReference],
  );
  const sections = useMemo(() => sectionLevels(document, evidence, findings), [document, evidence, findings]);
  const notTied = sections.reduce((sum, section) => sum + section.notTied, 0);
  const here = useHere();
  useWhere(useSectionAtCaret(editor));
  useStationCup('draft');
  return (
    <ReportPartsContext value={parts}>
      <main id="page" tabIndex={-1} data-region="page" className="report-desk">
        <article ref={page} className="report-page page-sheet" aria-label={`Report on ${problem.title}`}>
          <p className="report-running">
            <span>
              {problem.title} · {team.name}
            </span>
            <span>draft</span>
          </p>
          <TitleBlock />
          <div className="report-notice">
            <SessionNotice state={state} editor={editor} />
          </div>
          <EditorContent editor={editor} data-region-start />
          {Margin && <Margin editor={editor} page={page} />}
          {!readOnly && <TieList editor={editor} page={page} />}
          <SectionVessels
            page={page}
            sections={sections.map(({ section, level }) => ({
              section,
              share: levelShare(level),
              words: level,
              people: here.filter(({ where }) => where === section).map(({ name }) => firstName(name)),
            }))}
          />
          {card && (
            <ProvenanceCard
              reference={card.reference}
              unit={card.unit}
              onClose={close}
              place={{ top: card.top, left: 720 }}
              notch="left"
              takesFocus={card.byKey}
              standsIn={standsInSentence(card.reference, document, evidence, findings)}
            />
          )}
        </article>
      </main>
      <ReportSill editor={editor} state={{ ...state, readOnly }} notTied={notTied} />
    </ReportPartsContext>
  );
}

function useSectionAtCaret(editor: Editor): string {
  const [section, setSection] = useState('Report');
  useEffect(() => {
    const look = () => {
      const { $from } = editor.state.selection;
      const type = $from.depth > 0 ? $from.node(1).type.name : '';
      setSection(findSection(type)?.name ?? 'Report');
    };
    editor.on('selectionUpdate', look);
    return () => {
      editor.off('selectionUpdate', look);
    };
  }, [editor]);
  return section;
}
