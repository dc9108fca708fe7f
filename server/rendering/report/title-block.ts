import { fillColour, length } from '../pdf/operators.ts';
import { INK, INK_2, INK_3, INK_LINE, textStyle, type TextFace } from './print-style.ts';
import type { RenderContext } from './render-context.ts';
import { textBlock } from './text-block.ts';

/** What stands above the first section. */
export interface TitleFacts {
  readonly number: number;
  readonly title: string;
  /** The task as it was set. */
  readonly statement: string;
  readonly authors: readonly string[];
  readonly advisors: readonly string[];
  readonly team: string;
  readonly university: string;
  readonly isDemo: boolean;
}

const SERIF = { italic: 'bodyItalic', bold: 'bodyBold', boldItalic: 'bodyBoldItalic' } as const;
const NUMBER: TextFace = { ...SERIF, regular: 'body', size: 11.5, leading: 15, colour: INK_3 };
const TITLE: TextFace = { ...SERIF, regular: 'bodyMedium', size: 27, leading: 33, colour: INK };
const STATEMENT: TextFace = { ...SERIF, regular: 'bodyItalic', size: 12, leading: 17.5, colour: INK_2 };
const PEOPLE: TextFace = { ...SERIF, regular: 'ui', size: 9.75, leading: 14, colour: INK_2 };
const RULE_GAP = 14;
const SPACE_BELOW = 7;

/** Number, name, the task as set, authors, advisor and team, closed by a rule. */
export function drawTitleBlock(facts: TitleFacts, context: RenderContext): void {
  const { writer, flow, left, width } = context;
  const block = (text: string, face: TextFace, tag: string, space: number) => {
    const style = textStyle(face);
    textBlock([{ kind: 'text', text, style }], face, tag, context, space);
  };
  block(`Problem ${facts.number}`, NUMBER, 'P', 0);
  block(facts.title, TITLE, 'H1', 1);
  for (const paragraph of facts.statement.split(/\n+/u)) {
    if (paragraph.trim() !== '') block(paragraph.trim(), STATEMENT, 'P', 7);
  }
  block(peopleSentence(facts), PEOPLE, 'P', 10);
  flow.y += RULE_GAP;
  writer.artifact('Layout', () => {
    writer.write(`${fillColour(INK)} ${length(left)} ${length(flow.y)} ${length(width)} ${INK_LINE} re f`);
  });
  flow.y += SPACE_BELOW;
}

function peopleSentence(facts: TitleFacts): string {
  const { authors, advisors, team, university, isDemo } = facts;
  const advisor = advisors.length === 1 ? 'Advisor' : 'Advisors';
  return [
    authors.length > 0 ? `${authors.join(', ')}.` : '',
    advisors.length > 0 ? `${advisor} ${advisors.join(', ')}.` : '',
    `${[team, university].filter((name) => name !== '').join(', ')}.`,
    isDemo ? 'People and data are invented, for demonstration.' : '',
  ]
    .filter((part) => part !== '')
    .join(' ');
}
