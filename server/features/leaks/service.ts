import type { LeaksState } from '#shared/contracts/leaks.ts';
import { findLeaks } from '#shared/leaks/find-leaks.ts';
import type { Leak } from '#shared/leaks/leak.ts';
import type { LeakAnswer, LeakMark } from '#shared/leaks/prepared-leak.ts';
import type { ServerDeps } from '#server/deps.ts';
import { changedMeanwhile, notFound } from '#server/errors/refusals.ts';
import { getEvidence } from '#server/features/evidence/service.ts';
import { documentOf } from '#server/features/report/service.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { toLeakAnswer, toLeakMark } from './model.ts';

/** Leaks of the draft, answers and marks; what is found for the first time, or reads otherwise now, is marked. */
export async function getLeaks(deps: ServerDeps, place: ProblemPlace): Promise<LeaksState> {
  const leaks = await leaksOf(deps, place);
  const marks = await keepMarks(deps, place.problem.id, leaks);
  const answers = await listAnswers(deps, place.problem.id);
  return {
    leaks: leaks.map(({ id, name, force, section, question, evidence, mend }) => ({
      id,
      name,
      force,
      section,
      question,
      evidence,
      mend,
    })),
    answers,
    marks,
  };
}

/** The leaks of the draft as it stands now. */
export async function leaksOf(deps: ServerDeps, place: ProblemPlace): Promise<readonly Leak[]> {
  const { evidence } = await getEvidence(deps, place.problem.id);
  const [findings, { document }] = await Promise.all([
    deps.evaluation.getFindings(place.problem.id, evidence),
    documentOf(deps.database, place.problem.id, deps.now()),
  ]);
  return findLeaks({ evidence, findings, document });
}

/** Prepares an answer or, with an empty text, takes it away. */
export async function answerLeak(
  deps: ServerDeps,
  place: ProblemPlace,
  actor: Actor,
  change: { readonly leak: string; readonly text: string; readonly after: string | null },
): Promise<LeakAnswer | null> {
  const { leakAnswers, auditEvents } = deps.database.models;
  const leak = (await leaksOf(deps, place)).find(({ id }) => id === change.leak);
  if (!leak) throw notFound('This leak is not found any more. Look at the list again.');
  const where = { problemId: place.problem.id, leak: leak.id };
  const answer = { text: change.text, by: actor.name, at: deps.now().toISOString(), basis: leak.basis };
  await deps.database.write(async (transaction) => {
    const before = await leakAnswers.findOne({ where, raw: true, transaction });
    if ((before?.at ?? null) !== change.after) throw changedMeanwhile();
    await leakAnswers.destroy({ where, transaction });
    if (change.text !== '')
      await leakAnswers.create({ ...where, ...answer, userId: actor.id }, { transaction });
    await auditEvents.create(
      {
        teamId: place.team.id,
        problemId: place.problem.id,
        version: null,
        mutationId: null,
        userId: actor.id,
        at: answer.at,
        action: 'answer a leak',
        before: JSON.stringify([{ table: 'leak_answers', id: leak.id, text: before?.text ?? null }]),
        changes: JSON.stringify([{ table: 'leak_answers', id: leak.id, text: change.text }]),
      },
      { transaction },
    );
  });
  deps.events.publishStale(place, 'leaks', place.problem.number);
  return change.text === '' ? null : { leak: leak.id, ...answer };
}

async function listAnswers(deps: ServerDeps, problemId: string): Promise<LeakAnswer[]> {
  const rows = await deps.database.models.leakAnswers.findAll({
    where: { problemId },
    order: [['leak', 'ASC']],
    raw: true,
  });
  return rows.map(toLeakAnswer);
}

async function keepMarks(deps: ServerDeps, problemId: string, leaks: readonly Leak[]): Promise<LeakMark[]> {
  const { leakMarks } = deps.database.models;
  const rows = await leakMarks.findAll({ where: { problemId }, raw: true });
  const marks = new Map(rows.map((row) => [row.leak, toLeakMark(row)]));
  const moved = leaks.filter(({ id, question, evidence, section }) => {
    const mark = marks.get(id);
    return mark?.question !== question || mark.evidence !== evidence || mark.section !== section;
  });
  if (moved.length > 0) {
    const fresh = moved.map(({ id, name, section, question, evidence }): LeakMark => {
      const mark = { leak: id, name, section, question, evidence };
      marks.set(id, mark);
      return mark;
    });
    await deps.database.write(async (transaction) => {
      await leakMarks.destroy({ where: { problemId, leak: fresh.map(({ leak }) => leak) }, transaction });
      await leakMarks.bulkCreate(
        fresh.map((mark) => ({ problemId, ...mark })),
        { transaction },
      );
    });
  }
  return [...marks.values()].sort((a, b) => (a.leak < b.leak ? -1 : 1));
}
