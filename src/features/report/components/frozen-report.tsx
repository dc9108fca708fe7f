import '../report.css';
import type { Extensions, JSONContent } from '@tiptap/core';
import { EditorContent, useEditor, type Editor } from '@tiptap/react';
import { useEffect, useMemo, useState, type ReactNode, type RefObject } from 'react';
import { blockNumbers } from '#shared/report/block-numbers.ts';
import { reportExtensions } from '#shared/report/schema/report-extensions.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { standsInSentence } from '#shared/report/stands-in.ts';
import { settingNames } from '#shared/report/untied-numbers.ts';
import { ProvenanceCard } from '#src/components/provenance/provenance-card.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { createStore } from '#src/lib/store/create-store.ts';
import { foldedSections } from '../editor/folded-sections.ts';
import { LooseNumbers } from '../editor/loose-numbers.ts';
import type { OpenValue } from '../views/live-value-view.ts';
import { reportNodeViews } from '../views/report-node-views.ts';
import { ReportPartsContext } from './report-context.ts';
import { SectionVessels, type VesselledSection } from './section-vessels.tsx';
import { useOpenCard } from './use-open-card.ts';

interface FrozenReportProps {
  /** What this browser remembers of it is kept under this name. */
  readonly name: string;
  readonly document: ReportDocument;
  /** Running head, title block; above the sections. */
  readonly head: ReactNode;
  /** The reader's own vessels. */
  readonly sections: readonly VesselledSection[];
  readonly page: RefObject<HTMLElement | null>;
  /** Height of what covers the foot of the view. */
  readonly foot: number;
  /** What else is drawn into the text; taken once. */
  readonly extensions?: Extensions;
  readonly onEditor?: (editor: Editor) => void;
  /** Below the sections. */
  readonly children?: ReactNode;
}

/** A frozen report, drawn by the same parts as the one that is written, with nothing to write in. */
export function FrozenReport({
  name,
  document,
  head,
  sections,
  page,
  foot,
  extensions = [],
  onEditor,
  children,
}: FrozenReportProps) {
  const { problem } = useProblem();
  const { evidence, findings } = useFindingsSnapshot();
  const { card, openReference, close } = useOpenCard(page);
  const editor = useFrozenEditor({ name, document, extensions }, ({ attrs, element, byKey }) =>
    openReference(attrs.ref, element, byKey, attrs.unit),
  );
  useEffect(() => onEditor?.(editor), [editor, onEditor]);
  const parts = useMemo(
    () => ({ numbers: blockNumbers(document), openReference }),
    [document, openReference],
  );
  return (
    <ReportPartsContext value={parts}>
      <article ref={page} className="report-page page-sheet" aria-label={`Report on ${problem.title}`}>
        {head}
        <EditorContent editor={editor} data-region-start />
        {children}
        <SectionVessels page={page} sections={sections} foot={foot} />
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
    </ReportPartsContext>
  );
}

function useFrozenEditor(
  { name, document, extensions }: Required<Pick<FrozenReportProps, 'name' | 'document' | 'extensions'>>,
  onOpen: (value: OpenValue) => void,
): Editor {
  const { store } = useProblem();
  const { evidence } = useFindingsSnapshot();
  // The extensions are made once; what they call changes under them.
  const [open] = useState(() => createStore(onOpen));
  const [folded] = useState(() => foldedSections(name));
  useEffect(() => open.set(onOpen), [open, onOpen]);
  return useEditor(
    {
      editable: false,
      injectCSS: false,
      shouldRerenderOnTransaction: false,
      // The editor only reads it.
      content: document as unknown as JSONContent,
      extensions: [
        ...reportExtensions(
          reportNodeViews({ store, marks: null, folded, onOpen: (value) => open.get()(value) }),
        ),
        LooseNumbers.configure({ getSettings: () => settingNames(evidence), isForReading: true }),
        ...extensions,
      ],
      editorProps: { attributes: { class: 'report-text', lang: 'en' } },
    },
    [document],
  );
}
