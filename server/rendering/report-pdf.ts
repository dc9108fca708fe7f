import type { Person, Problem, Team } from '#shared/contracts/teams.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { blockNumbers } from '#shared/report/block-numbers.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { settingNames } from '#shared/report/untied-numbers.ts';
import { PdfWriter } from './pdf/pdf-writer.ts';
import { drawBlocks } from './report/block-handlers.ts';
import { NumberSources } from './report/number-sources.ts';
import { PageFlow, type Frame } from './report/page-flow.ts';
import { printDate } from './report/print-date.ts';
import type { RenderContext } from './report/render-context.ts';
import { drawRunningParts } from './report/running-parts.ts';
import { drawSection } from './report/section.ts';
import { drawSourcesList } from './report/sources-list.ts';
import { drawTitleBlock } from './report/title-block.ts';
import { drawWatermark, lentWords, type LentTo } from './report/watermark.ts';

type Named = Pick<Person, 'name' | 'role'>;

/** Everything a report is printed from; nothing else reaches the file. */
export interface ReportPdfInput {
  readonly problem: Pick<Problem, 'number' | 'title' | 'statement'> & { readonly owners: readonly Named[] };
  readonly team: Pick<Team, 'name' | 'university' | 'isDemo'> & { readonly people: readonly Named[] };
  readonly document: ReportDocument;
  readonly evidence: Evidence;
  readonly findings: Findings;
  /** JPEG bytes of the report's pictures by fingerprint. */
  readonly plates: ReadonlyMap<string, Uint8Array>;
  /** The edition that is printed, with its seal; null: "Draft" stands in the foot. */
  readonly edition: { readonly n: number; readonly seal: string } | null;
  /** To whom it is lent: written across every page and in its foot; absent: it is the team's own. */
  readonly lentTo?: LentTo;
  /** Moment written on the pages and into the file, ISO 8601. */
  readonly at: string;
}

export interface ReportPdf {
  readonly bytes: Uint8Array;
  readonly pages: number;
}

/** Told now and then: the share done, 0 to 1, and what is being done, in words. */
export type OnProgress = (share: number, at: string) => void;

/** Margins in points: 24 mm at the sides. */
const SIDE = 68.03;
const TOP = 85;
const FIRST_TOP = 64;
const BOTTOM = 66;
const PARAGRAPH_SPACE = 6.75;
/** Shares of the work that the sections, and the list of numbers, come to. */
const SECTIONS_SHARE = 0.85;
const SOURCES_SHARE = 0.92;

/** Prints a report: A4 or Letter as the problem says, tagged, with bookmarks; the same bytes for the same input. */
export async function renderReportPdf(input: ReportPdfInput, onProgress?: OnProgress): Promise<ReportPdf> {
  const { problem, team, document, evidence } = input;
  const at = new Date(input.at);
  const advisors = team.people.filter((person) => person.role === 'advisor').map((person) => person.name);
  const authors = problem.owners.filter((owner) => owner.role !== 'advisor').map((owner) => owner.name);
  const writer = new PdfWriter({
    paper: evidence.settings.paper,
    title: `Problem ${problem.number}: ${problem.title}`,
    author: authors.length > 0 ? authors.join(', ') : team.name,
    subject: problem.statement,
    at,
  });
  const context = startContext(writer, input);
  drawTitleBlock({ ...problem, authors, advisors, ...teamFacts(team) }, context);
  document.content.forEach((section, i) => {
    onProgress?.((SECTIONS_SHARE * i) / document.content.length, `Setting section ${i + 1} of 5`);
    drawSection(section, context);
  });
  onProgress?.(SECTIONS_SHARE, 'Listing where the numbers come from');
  drawSourcesList(context);
  context.flow.flush();
  onProgress?.(SOURCES_SHARE, 'Closing the file');
  drawRunningParts(writer, context.flow.frame, {
    title: problem.title,
    team: `${team.name}, ${team.university}`,
    foot: footOf(input),
    edition: input.edition,
  });
  if (input.lentTo) drawWatermark(writer, input.lentTo);
  const pages = writer.pageCount;
  return { bytes: await writer.finish(), pages };
}

function footOf({ edition, lentTo, at }: ReportPdfInput): string {
  const date = printDate(new Date(at));
  if (edition === null) return `Draft, ${date}`;
  return `Edition ${edition.n}, ${date}${lentTo ? `. ${lentWords(lentTo)}` : ''}`;
}

function teamFacts(team: ReportPdfInput['team']) {
  return { team: team.name, university: team.university, isDemo: team.isDemo };
}

function startContext(writer: PdfWriter, input: ReportPdfInput): RenderContext {
  const { evidence, findings, plates } = input;
  const { width, height } = writer.size;
  const frame: Frame = { left: SIDE, right: width - SIDE, top: TOP, bottom: height - BOTTOM };
  return {
    writer,
    flow: new PageFlow(writer, frame, FIRST_TOP),
    evidence,
    findings,
    numbers: blockNumbers(input.document),
    sources: new NumberSources(evidence, findings),
    settings: settingNames(evidence),
    plates,
    element: writer.root,
    left: frame.left,
    width: frame.right - frame.left,
    space: PARAGRAPH_SPACE,
    outline: writer.outline,
    blocks: drawBlocks,
  };
}
