import { useState } from 'react';
import { NotesMargin } from '#src/features/notes/components/notes-margin.tsx';
import { createNoteDesk } from '#src/features/notes/view/note-desk.ts';
import type { OpenPage, ReportSlots } from '#src/features/report/components/report-slots.ts';
import { ReportStation } from '#src/features/report/routes/report-station.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

/** The report with its margin: the two know of each other only here. */
export function Component() {
  const { problem } = useProblem();
  useTitle('Report', problem.title);
  const [slots] = useState(slotsWithNotes);
  return <ReportStation {...slots} />;
}

function slotsWithNotes(): ReportSlots {
  const desk = createNoteDesk();
  return {
    extensions: desk.extensions,
    Margin: (open: OpenPage) => <NotesMargin desk={desk} {...open} />,
  };
}
