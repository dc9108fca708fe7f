/** A problem's evidence: read whole, changed in steps. Other features change evidence only through `commitStep`. */
import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { applyStep } from '#shared/evidence/apply-change.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { evidenceChangeSchema } from '#shared/contracts/evidence-changes.ts';
import type { EvidenceChange, EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import type { Task } from '#shared/contracts/teams.ts';
import type { Database } from '#server/database/database.ts';
import type { EventHub } from '#server/features/events/service.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { readEvidence } from './read-evidence.ts';
import { addClaimForTask } from './rows.ts';
import type { StoredEvidence } from './read-evidence.ts';

export { addClaimForTask, replaceContent } from './rows.ts';
export { storeEvidence } from './store-evidence.ts';
export { toTrial } from './read-evidence.ts';

export interface EvidenceDeps {
  readonly database: Database;
  readonly events: EventHub;
  readonly now: () => Date;
  readonly evidenceCache: EvidenceCache;
}

/** Evidence lately read, by problem: a step is applied to it instead of reading ten thousand trials again. */
export interface EvidenceCache {
  readonly held: Map<string, StoredEvidence>;
}

const MAX_HELD_PROBLEMS = 40;

export function createEvidenceCache(): EvidenceCache {
  return { held: new Map() };
}

/** One change of evidence while it is being made. */
export interface StepDraft {
  readonly transaction: Transaction;
  /** Version the evidence will have. */
  readonly version: number;
  /** Evidence as it was before this step. */
  readonly evidence: Evidence;
  readonly rowVersions: Readonly<Record<string, number>>;
  readonly at: string;
  /** Says what changes, from what; rowVersion for definitions only. */
  change(change: EvidenceChange, before: unknown, rowVersion?: number): void;
}

export interface StepRequest {
  readonly mutationId: string;
  /** What is done, in words for the audit log: "log trials of series B". */
  readonly action: string;
}

/** The whole evidence of a problem and its rows' versions. */
export async function getEvidence(deps: EvidenceDeps, problemId: string): Promise<StoredEvidence> {
  const held = deps.evidenceCache.held.get(problemId);
  if (held) return held;
  return deps.database.read(async (transaction) => {
    const stored = await readEvidence(deps.database, problemId, transaction);
    hold(deps.evidenceCache, problemId, stored);
    return stored;
  });
}

/**
 * Makes one step: in one transaction `work` writes its rows, the version grows by one and the audit event is written;
 * then every tab that watches the problem is told. Sent again with the same mutation id, the step made the first time
 * is answered and nothing is done. Without any change there is no step: the answer has the version as it stands.
 */
export async function commitStep(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  request: StepRequest,
  work: (draft: StepDraft) => Promise<void>,
): Promise<EvidenceStep> {
  const made = await deps.database.write(
    async (transaction): Promise<MadeStep> => {
      const repeated = await findStep(deps, place.problem.id, { ...request, userId: actor.id }, transaction);
      if (repeated) return { step: repeated, outcome: null };
      const stored = await currentEvidence(deps, place.problem.id, transaction);
      const draft = createDraft(stored, transaction, deps.now().toISOString());
      await work(draft);
      const { changes, version } = draft;
      const { mutationId } = request;
      if (changes.length === 0) {
        return { step: { version: stored.evidence.version, changes, mutationId }, outcome: null };
      }
      await writeStep(deps, place, actor, request, draft);
      return { step: { version, changes, mutationId }, outcome: draft.outcome() };
    },
    ({ step, outcome }) => {
      if (!outcome) return;
      hold(deps.evidenceCache, place.problem.id, outcome);
      deps.events.publishStep(place, step);
      deps.events.publishStale(place, 'problems');
    },
  );
  return made.step;
}

interface MadeStep {
  readonly step: EvidenceStep;
  /** null: nothing was written. */
  readonly outcome: StoredEvidence | null;
}

/** The step of an earlier version, as it was told then. */
export async function getStep(
  deps: EvidenceDeps,
  problemId: string,
  version: number,
  transaction: Transaction,
): Promise<EvidenceStep | null> {
  return findStep(deps, problemId, { version }, transaction);
}

/** Inside the write, where nobody else writes, what is held is what is stored. */
async function currentEvidence(
  deps: EvidenceDeps,
  problemId: string,
  transaction: Transaction,
): Promise<StoredEvidence> {
  return (
    deps.evidenceCache.held.get(problemId) ?? (await readEvidence(deps.database, problemId, transaction))
  );
}

type Draft = StepDraft & {
  readonly changes: EvidenceChange[];
  readonly before: unknown[];
  outcome(): StoredEvidence;
};

function createDraft(stored: StoredEvidence, transaction: Transaction, at: string): Draft {
  const version = stored.evidence.version + 1;
  const changes: EvidenceChange[] = [];
  const before: unknown[] = [];
  const rowVersions = { ...stored.rowVersions };
  return {
    transaction,
    version,
    evidence: stored.evidence,
    rowVersions: stored.rowVersions,
    at,
    changes,
    before,
    change(change, was, rowVersion) {
      changes.push(change);
      before.push(was);
      if (rowVersion !== undefined && 'id' in change) rowVersions[change.id] = rowVersion;
      if ('id' in change && change.row === null) delete rowVersions[change.id];
    },
    outcome: () => ({ evidence: applyStep(stored.evidence, changes, version), rowVersions }),
  };
}

async function writeStep(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  request: StepRequest,
  draft: Draft,
): Promise<void> {
  const { problems, auditEvents } = deps.database.models;
  await problems.update(
    { evidenceVersion: draft.version },
    { where: { id: place.problem.id }, transaction: draft.transaction },
  );
  await auditEvents.create(
    {
      teamId: place.team.id,
      problemId: place.problem.id,
      version: draft.version,
      mutationId: request.mutationId,
      userId: actor.id,
      at: draft.at,
      action: request.action,
      before: JSON.stringify(draft.before),
      changes: JSON.stringify(draft.changes),
    },
    { transaction: draft.transaction },
  );
}

async function findStep(
  deps: EvidenceDeps,
  problemId: string,
  where:
    | { readonly version: number }
    | { readonly mutationId: string; readonly action: string; readonly userId: string },
  transaction: Transaction,
): Promise<EvidenceStep | null> {
  const event = await deps.database.models.auditEvents.findOne({
    where: { problemId, ...where },
    raw: true,
    transaction,
  });
  if (!event || event.version === null) return null;
  return {
    version: event.version,
    changes: evidenceChangeSchema.array().parse(JSON.parse(event.changes)),
    mutationId: event.mutationId ?? '',
  };
}

function hold(cache: EvidenceCache, problemId: string, stored: StoredEvidence): void {
  const held = cache.held.get(problemId);
  if (held && held.evidence.version > stored.evidence.version) return;
  cache.held.delete(problemId);
  cache.held.set(problemId, stored);
  for (const oldest of cache.held.keys()) {
    if (cache.held.size <= MAX_HELD_PROBLEMS) break;
    cache.held.delete(oldest);
  }
}

/** First step of a new problem, inside the transaction that makes it: a claim for each of its tasks. */
export async function createFirstStep(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  tasks: readonly Task[],
  transaction: Transaction,
): Promise<void> {
  const stored = await readEvidence(deps.database, place.problem.id, transaction);
  const draft = createDraft(stored, transaction, deps.now().toISOString());
  for (const task of tasks) await addClaimForTask(deps.database, place.problem.id, task, draft);
  await writeStep(deps, place, actor, { mutationId: randomUUID(), action: 'open the problem' }, draft);
}
