/** The definitions of a problem: made, replaced whole, removed while nothing uses them. Captain and members. */
import { randomUUID } from 'node:crypto';
import type { Claim, Evidence } from '#shared/evidence/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import { AppError } from '#server/errors/app-error.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { checkDefinition } from './check-definition.ts';
import { getRow, insertContent, nextPosition, removeRow, replaceContent } from './rows.ts';
import type { DefinitionRow } from './rows.ts';
import { letterAt, MAX_SERIES } from './series-letter.ts';
import { commitStep } from './service.ts';
import type { EvidenceDeps, StepDraft } from './service.ts';
import { findUses } from './uses.ts';

/** What the client sends of a row: all but what the server gives. */
export type DefinitionBody = object;

export interface DefinitionChange {
  readonly table: DefinitionTable;
  readonly mutationId: string;
  readonly body: DefinitionBody;
}

export interface DefinitionAnswer extends EvidenceStep {
  readonly id: string;
  readonly rowVersion: number;
}

/** Makes a row. 422 `invalid` with fields when it cannot be read; 422 `too-many` past the bound of its table. */
export async function createDefinition(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  { table, mutationId, body }: DefinitionChange,
): Promise<DefinitionAnswer> {
  const request = { mutationId, action: `add to ${table}` };
  const step = await commitStep(deps, place, actor, request, async (draft) => {
    const position = await nextPosition(deps.database, table, place.problem.id, draft.transaction);
    assertRoom(draft.evidence, table, position);
    const given = { ...givenAt(table, position, draft, actor), id: randomUUID() };
    const row = checkDefinition(table, { ...body, ...given }, draft.evidence);
    await insertContent(deps.database, place.problem.id, table, { row, position }, draft);
  });
  return { ...step, id: changedId(step), rowVersion: 1 };
}

/** Replaces a row that has version `ifMatch`; 404, 409 `changed-meanwhile`, 422 as for a new one. */
export async function replaceDefinition(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  { table, mutationId, body }: DefinitionChange,
  { id, ifMatch }: { readonly id: string; readonly ifMatch: number },
): Promise<DefinitionAnswer> {
  const request = { mutationId, action: `change ${table} ${id}` };
  const step = await commitStep(deps, place, actor, request, async (draft) => {
    const before = getRow(draft.evidence, table, id);
    const given = { ...keptFrom(before, body, draft, actor), id };
    const row = checkDefinition(table, { ...body, ...given }, draft.evidence);
    await replaceContent(deps.database, place.problem.id, table, row, draft, ifMatch);
  });
  return { ...step, id, rowVersion: ifMatch + 1 };
}

/** Removes a row; 409 `still-used` names what uses it. */
export async function removeDefinition(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  {
    table,
    mutationId,
    id,
  }: { readonly table: DefinitionTable; readonly mutationId: string; readonly id: string },
): Promise<EvidenceStep> {
  const request = { mutationId, action: `remove ${table} ${id}` };
  return commitStep(deps, place, actor, request, async (draft) => {
    getRow(draft.evidence, table, id);
    const uses = findUses(draft.evidence, table, id);
    if (uses.length > 0) throw stillUsed(uses);
    await removeRow(deps.database, place.problem.id, table, id, draft);
  });
}

/** What the server gives a new row: number or letter, and when and by whom it was stated. */
function givenAt(table: DefinitionTable, position: number, draft: StepDraft, actor: Actor): object {
  switch (table) {
    case 'series':
      return { letter: letterAt(position) };
    case 'models':
      return { n: position, at: draft.at, by: actor.name };
    case 'claims':
      return { n: position, declaredAt: draft.at };
    case 'charts':
      return { n: position };
    default:
      return {};
  }
}

/** What stays through a replacement. A model stated anew bears the new date; so does a claim whose test is set anew. */
function keptFrom(before: DefinitionRow, body: DefinitionBody, draft: StepDraft, actor: Actor): object {
  if ('letter' in before) return { letter: before.letter };
  if ('equations' in before) return { n: before.n, at: draft.at, by: actor.name };
  if ('declaredAt' in before) {
    const isSameTest = 'test' in body && isSame(body.test, before.test);
    return { n: before.n, declaredAt: isSameTest ? before.declaredAt : draft.at };
  }
  return 'n' in before ? { n: before.n } : {};
}

function isSame(a: unknown, b: Claim['test']): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}

const MAX_ROWS = 500;

function assertRoom(evidence: Evidence, table: DefinitionTable, position: number): void {
  if (evidence[table].length < MAX_ROWS && (table !== 'series' || position <= MAX_SERIES)) return;
  throw new AppError(422, 'too-many', `A problem holds at most ${MAX_ROWS} of these. Remove one first.`);
}

function changedId(step: EvidenceStep): string {
  const [change] = step.changes;
  return change && 'id' in change ? change.id : '';
}

const MAX_NAMED_USES = 4;

function stillUsed(uses: readonly string[]): AppError {
  const named = uses.slice(0, MAX_NAMED_USES).join(', ');
  const rest = uses.length > MAX_NAMED_USES ? ` and ${uses.length - MAX_NAMED_USES} more` : '';
  return new AppError(
    409,
    'still-used',
    `Still used by ${named}${rest}. Change that first, then remove this.`,
  );
}
