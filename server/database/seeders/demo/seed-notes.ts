import { absolutePositionToRelativePosition, initProseMirrorDoc } from '@tiptap/y-tiptap';
import type { Transaction } from 'sequelize';
import * as Y from 'yjs';
import { contextOf, occurrences } from '#shared/notes/find-quote.ts';
import type { TextAnchor } from '#shared/notes/note-anchor.ts';
import type { NoteState } from '#shared/notes/note-states.ts';
import { sectionText, toRange } from '#shared/notes/section-text.ts';
import { reportSchema } from '#shared/report/schema/report-schema.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';
import type { Database } from '#server/database/database.ts';
import { REPORT_FRAGMENT } from '#server/features/report/service.ts';
import { momentBefore } from './demo-clock.ts';
import { DEMO_PEOPLE } from './people.ts';

interface DemoNote {
  readonly section: SectionName;
  readonly quote: string;
  readonly text: string;
  readonly at: readonly [days: number, time: string];
  readonly state: NoteState;
  readonly answer?: { readonly by: string; readonly text: string; readonly at: readonly [number, string] };
  readonly settled?: { readonly by: string; readonly at: readonly [number, string]; readonly reason: string };
}

/** What the advisor has written beside the report of problem 1: one note in each state. */
const NOTES: readonly DemoNote[] = [
  {
    section: 'Model',
    quote: 'no free parameter left',
    text: 'This is your best sentence. Say it at the podium in these words.',
    at: [5, '16:42'],
    state: 'agreed',
    answer: {
      by: 'demo-ines',
      text: 'It opens the slide of the model now, word for word.',
      at: [4, '18:05'],
    },
    settled: { by: 'demo-odile', at: [3, '09:12'], reason: '' },
  },
  {
    section: 'Phenomenon',
    quote: 'Holes of other shapes',
    text: 'A jury will ask about a slit. Are you sure you want to leave it out?',
    at: [5, '16:20'],
    state: 'held to',
    answer: {
      by: 'demo-maren',
      text: 'A slit throws a sheet, and a sheet has no one landing point.',
      at: [4, '17:31'],
    },
    settled: {
      by: 'demo-ines',
      at: [3, '12:40'],
      reason: 'The task speaks of a small hole. We say so in the first lines and keep to it.',
    },
  },
  {
    section: 'Comparison',
    quote: 'drag on the broken jet',
    text: '“Put down to” is a guess until you have seen where the jet breaks. Which trials show it?',
    at: [2, '14:20'],
    state: 'answered',
    answer: {
      by: 'demo-kasimir',
      text: 'None yet. We film it at 45° on Thursday, against the ruled wall.',
      at: [1, '18:31'],
    },
  },
  {
    section: 'Conclusion',
    quote: 'What would prove us wrong',
    text: 'Good that you say it. Name the number: how short would a whole jet have to land?',
    at: [1, '19:05'],
    state: 'open',
  },
];

/** Four notes beside the report of a problem, placed in the document that is stored. */
export async function seedNotes(
  database: Database,
  problemId: string,
  firstStart: Date,
  transaction: Transaction,
): Promise<void> {
  const { marginNotes, noteReplies, reportDocs } = database.models;
  const stored = await reportDocs.findByPk(problemId, { transaction });
  if (!stored) throw new Error(`seedNotes: needs the report of ${problemId}`);
  const place = placerIn(stored.state);
  const at = ([days, time]: readonly [number, string]) => momentBefore(firstStart, days, time);
  for (const [index, { section, quote, text, state, answer, settled, ...note }] of NOTES.entries()) {
    const id = `demo-note-${index + 1}`;
    await marginNotes.create(
      {
        id,
        problemId,
        n: index + 1,
        section,
        anchor: JSON.stringify(place(section, quote)),
        text,
        by: nameOf('demo-odile'),
        userId: 'demo-odile',
        at: at(note.at),
        state,
        reason: settled?.reason ?? '',
        settledBy: settled ? nameOf(settled.by) : null,
        settledAt: settled ? at(settled.at) : null,
        revision: 0,
      },
      { transaction },
    );
    if (!answer) continue;
    const reply = { id: `demo-reply-${index + 1}`, noteId: id, text: answer.text, userId: answer.by };
    await noteReplies.create({ ...reply, by: nameOf(answer.by), at: at(answer.at) }, { transaction });
  }
}

/** Places quotes in a stored document; each must stand in its section once. */
function placerIn(state: Uint8Array): (section: SectionName, quote: string) => TextAnchor {
  const document = new Y.Doc();
  Y.applyUpdate(document, state);
  const fragment = document.getXmlFragment(REPORT_FRAGMENT);
  const { doc, mapping } = initProseMirrorDoc(fragment, reportSchema());
  const encode = (position: number) => {
    const relative = absolutePositionToRelativePosition(position, fragment, mapping) as Y.RelativePosition;
    return Buffer.from(Y.encodeRelativePosition(relative)).toString('base64');
  };
  return (section, quote) => {
    const read = sectionText(doc, section);
    const [span, second] = occurrences(read.text, quote);
    const range = span ? toRange(read, span) : null;
    if (!span || !range || second) throw new RangeError(`seedNotes: needs "${quote}" once in ${section}`);
    return {
      kind: 'text',
      from: encode(range.from),
      to: encode(range.to),
      quote,
      said: quote,
      ...contextOf(read.text, span),
    };
  };
}

function nameOf(id: string): string {
  const person = DEMO_PEOPLE.find((candidate) => candidate.id === id);
  if (!person) throw new RangeError(`nameOf: needs a person of the demonstration, got ${id}`);
  return person.name;
}
