/** Trials: logged in batches, corrected, left out, brought back, taken back. Never deleted. Captain and members. */
import type { Transaction } from 'sequelize';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import type { changeTrial as changeTrialEndpoint, NewTrial } from '#shared/contracts/evidence.ts';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import type { Series } from '#shared/evidence/evidence.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import { commitStep, getStep, toTrial } from '#server/features/evidence/service.ts';
import type { EvidenceDeps, StepDraft } from '#server/features/evidence/service.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { changedTrial } from './changed-trial.ts';
import { assertReadings } from './check-readings.ts';
import type { TrialReadings } from './check-readings.ts';
import type { TrialModel } from './model.ts';

const MAX_TRIALS = 10_000;

interface Batch {
  readonly series: string;
  readonly mutationId: string;
  readonly trials: readonly NewTrial[];
}

/**
 * Logs trials, all or none, in one step, and gives them their numbers. A trial that is here already is not logged
 * again; when all of them are, the step that logged them is answered. 404 without the series, 422 `reading-refused`,
 * 409 `id-taken`, 422 `too-many-trials`.
 */
export async function logTrials(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  batch: Batch,
): Promise<EvidenceStep> {
  const request = { mutationId: batch.mutationId, action: `log trials in series ${batch.series}` };
  let loggedBefore: number | null = null;
  const step = await commitStep(deps, place, actor, request, async (draft) => {
    const series = draft.evidence.series.find(({ id }) => id === batch.series);
    if (!series) throw notFound('This series is not here any more.');
    const { fresh, known } = await sort(deps, place, actor, batch, draft.transaction);
    loggedBefore = fresh.length === 0 ? (known[0]?.loggedVersion ?? null) : null;
    if (draft.evidence.trials.length + fresh.length > MAX_TRIALS) throw tooManyTrials();
    assertReadings(namedIn(batch, fresh), series, draft.evidence);
    await insert(deps, place, actor, { series, fresh }, draft);
  });
  if (loggedBefore === null || step.changes.length > 0) return step;
  return earlierStep(deps, place, loggedBefore, step);
}

/** Corrects, excludes, brings back or withdraws one trial. 404, 422 `reading-refused`, 409 `not-possible`. */
export async function changeTrial(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  trialId: string,
  { mutationId, change }: BodyOf<typeof changeTrialEndpoint>,
): Promise<EvidenceStep> {
  const request = { mutationId, action: `${change.kind} trial ${trialId}` };
  return commitStep(deps, place, actor, request, async (draft) => {
    const before = draft.evidence.trials.find(({ id }) => id === trialId);
    const series = draft.evidence.series.find(({ id }) => id === before?.series);
    if (!before || !series) throw notFound('This trial is not here.');
    const after = changedTrial(before, change, { by: actor.name, at: draft.at });
    if (change.kind === 'correct') {
      const name = `${series.letter}${after.number}`;
      assertReadings([{ name, path: 'change.values', values: after.values }], series, draft.evidence);
    }
    await deps.database.models.trials.update(
      {
        values: JSON.stringify(after.values),
        note: after.note ?? null,
        excluded: after.excluded ? JSON.stringify(after.excluded) : null,
        withdrawn: after.withdrawn ? JSON.stringify(after.withdrawn) : null,
      },
      { where: { problemId: place.problem.id, id: trialId }, transaction: draft.transaction },
    );
    draft.change({ table: 'trials', id: trialId, row: after }, before);
  });
}

/** Which trials of a batch are new, and which were logged before by the same person in the same series. */
async function sort(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  batch: Batch,
  transaction: Transaction,
) {
  const ids = batch.trials.map(({ id }) => id);
  if (new Set(ids).size < ids.length) throw idTaken();
  const known = await deps.database.models.trials.findAll({
    where: { problemId: place.problem.id, id: ids },
    raw: true,
    transaction,
  });
  if (known.some((row) => row.seriesId !== batch.series || row.userId !== actor.id)) throw idTaken();
  const knownIds = new Set(known.map(({ id }) => id));
  return { fresh: batch.trials.filter(({ id }) => !knownIds.has(id)), known };
}

/** Trials that have no number yet, named by their place in the batch. */
function namedIn(batch: Batch, fresh: readonly NewTrial[]): TrialReadings[] {
  return batch.trials.flatMap((trial, index) => {
    if (!fresh.includes(trial)) return [];
    const name = batch.trials.length === 1 ? 'This trial' : `Trial ${index + 1} of these`;
    return [{ name, path: `trials.${index}.values`, values: trial.values }];
  });
}

async function insert(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  { series, fresh }: { readonly series: Series; readonly fresh: readonly NewTrial[] },
  draft: StepDraft,
): Promise<void> {
  const { trials } = deps.database.models;
  const { transaction } = draft;
  const problemId = place.problem.id;
  const bySeries = { where: { problemId, seriesId: series.id }, transaction };
  const lastNumber = (await trials.max<number | null, TrialModel>('number', bySeries)) ?? 0;
  const lastOrder =
    (await trials.max<number | null, TrialModel>('runOrder', { where: { problemId }, transaction })) ?? 0;
  const rows = fresh.map((trial, index) => ({
    problemId,
    id: trial.id,
    seriesId: series.id,
    number: lastNumber + 1 + index,
    runOrder: lastOrder + 1 + index,
    userId: actor.id,
    by: actor.name,
    at: trial.at ?? draft.at,
    values: JSON.stringify(trial.values),
    note: trial.note ?? null,
    excluded: null,
    withdrawn: null,
    loggedVersion: draft.version,
  }));
  await trials.bulkCreate(rows, { transaction });
  for (const row of rows) draft.change({ table: 'trials', id: row.id, row: toTrial(row) }, null);
}

/** The step that logged the trials first: sent again, a batch is answered as it was. */
async function earlierStep(
  deps: EvidenceDeps,
  place: ProblemPlace,
  version: number,
  now: EvidenceStep,
): Promise<EvidenceStep> {
  const step = await deps.database.read((transaction) =>
    getStep(deps, place.problem.id, version, transaction),
  );
  return step ?? now;
}

function idTaken(): AppError {
  return new AppError(409, 'id-taken', 'A trial with this id is here already, and it is another one.');
}

function tooManyTrials(): AppError {
  return new AppError(
    422,
    'too-many-trials',
    `A problem holds at most ${MAX_TRIALS} trials. Reduce longer tables to one reading each.`,
  );
}
