/**
 * The room in which the readers of a copy prepare their questions. Its key is set by who enters first and kept as a
 * hash; whoever is signed in as one of the team that lent the copy finds no room here at all.
 */
import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import {
  MAX_QUESTIONS,
  questionAboutSchema,
  type QuestionAbout,
  type Questions,
} from '#shared/contracts/copy-questions.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import { fitsPassphrase, hashPassphrase } from '#server/features/account/service.ts';
import { findCopy, getOpenCopy, noCopy, type CopyVisitor, type ReadingDeps } from './find-copy.ts';
import type { CopyModel } from './model.ts';

/** Two minutes, until the readers say otherwise. */
const USUAL_SECONDS = 120;

export interface NewQuestion {
  readonly text: string;
  readonly about: QuestionAbout | null;
  readonly seconds: number;
}

export interface QuestionChange {
  readonly text?: string | undefined;
  readonly about?: QuestionAbout | null | undefined;
  readonly seconds?: number | undefined;
  readonly place?: number | undefined;
}

/** Whether a key is set, and whether this visitor has shown it. */
export async function getRoom(
  deps: ReadingDeps,
  visitor: CopyVisitor,
): Promise<{ keySetAt: string | null; isOpen: boolean }> {
  const { row, isLender } = await getOpenCopy(deps, visitor);
  if (isLender) throw noCopy();
  const room = await deps.database.models.copyRooms.findByPk(row.id, { raw: true });
  return { keySetAt: room?.keySetAt ?? null, isOpen: room !== null && hasKey(deps, row, visitor) };
}

/** Sets the key, or takes it; gives the pass to the room. 422 `wrong-key`; the one 404 for who may not be here. */
export async function enterRoom(deps: ReadingDeps, visitor: CopyVisitor, key: string): Promise<string> {
  const found = await findCopy(deps, visitor);
  if (!found || found.isLender || found.standing === 'waiting') {
    // Takes as long as with a key to compare, so that the time tells nothing.
    await fitsPassphrase(null, key);
    throw noCopy();
  }
  if (found.standing === 'open') await getOpenCopy(deps, visitor);
  const { row } = found;
  const before = await deps.database.models.copyRooms.findByPk(row.id, { raw: true });
  const keyHash = before?.keyHash ?? (found.standing === 'open' ? await setKey(deps, row, key) : null);
  if (await fitsPassphrase(keyHash, key)) return deps.copyPasses.issue('room', row.id);
  if (found.standing !== 'open') throw noCopy();
  const sentence = 'This is not the key of this room. Ask who of yours set it.';
  throw new AppError(422, 'wrong-key', sentence, { fields: { key: sentence } });
}

/** The hash of the room's key from now on: ours, unless somebody was a moment faster. */
async function setKey({ database, now }: ReadingDeps, { id }: CopyModel, key: string): Promise<string> {
  const keyHash = await hashPassphrase(key);
  return database.write(async (transaction) => {
    const [room] = await database.models.copyRooms.findOrCreate({
      where: { copyId: id },
      defaults: { copyId: id, keyHash, keySetAt: now().toISOString(), seconds: USUAL_SECONDS },
      transaction,
    });
    return room.keyHash;
  });
}

/** The questions in their order. With the key they stay readable after the copy has closed. */
export async function listQuestions(deps: ReadingDeps, visitor: CopyVisitor): Promise<Questions> {
  const found = await findCopy(deps, visitor);
  if (!found || found.isLender) throw noCopy();
  if (found.standing !== 'open') {
    if (!hasKey(deps, found.row, visitor)) throw noCopy();
    return read(deps, found.row.id, null);
  }
  await enter(deps, visitor);
  return read(deps, found.row.id, null);
}

/** Changes the time allowed for all questions. */
export async function changeRoom(
  deps: ReadingDeps,
  visitor: CopyVisitor,
  seconds: number,
): Promise<Questions> {
  return change(deps, visitor, async (copyId, transaction) => {
    await deps.database.models.copyRooms.update({ seconds }, { where: { copyId }, transaction });
  });
}

/** Adds a question at the end; 409 `too-many-questions`. */
export async function addQuestion(
  deps: ReadingDeps,
  visitor: CopyVisitor,
  { text, about, seconds }: NewQuestion,
): Promise<Questions> {
  const { copyQuestions } = deps.database.models;
  return change(deps, visitor, async (copyId, transaction) => {
    const position = await copyQuestions.count({ where: { copyId }, transaction });
    if (position >= MAX_QUESTIONS) {
      throw new AppError(
        409,
        'too-many-questions',
        `There are ${MAX_QUESTIONS} questions already. Remove one first.`,
      );
    }
    await copyQuestions.create(
      {
        id: randomUUID(),
        copyId,
        position,
        text,
        about: storedAbout(about),
        seconds,
        writtenAt: deps.now().toISOString(),
      },
      { transaction },
    );
  });
}

/** Changes a question, or moves it; 404 when it is not of this room. */
export async function changeQuestion(
  deps: ReadingDeps,
  visitor: CopyVisitor,
  id: string,
  { text, about, seconds, place }: QuestionChange,
): Promise<Questions> {
  const { copyQuestions } = deps.database.models;
  return change(deps, visitor, async (copyId, transaction) => {
    const [changed] = await copyQuestions.findAll({ where: { copyId, id }, transaction });
    if (!changed) throw notFound('This question is gone.');
    await changed.update(
      {
        ...(text === undefined ? {} : { text }),
        ...(about === undefined ? {} : { about: storedAbout(about) }),
        ...(seconds === undefined ? {} : { seconds }),
      },
      { transaction },
    );
    if (place !== undefined) await putInOrder(deps, copyId, transaction, { id, place });
  });
}

/** Removes a question; 404 when it is not of this room. */
export async function removeQuestion(
  deps: ReadingDeps,
  visitor: CopyVisitor,
  id: string,
): Promise<Questions> {
  return change(deps, visitor, async (copyId, transaction) => {
    const removed = await deps.database.models.copyQuestions.destroy({ where: { copyId, id }, transaction });
    if (removed === 0) throw notFound('This question is gone.');
    await putInOrder(deps, copyId, transaction, null);
  });
}

async function change(
  deps: ReadingDeps,
  visitor: CopyVisitor,
  work: (copyId: string, transaction: Transaction) => Promise<void>,
): Promise<Questions> {
  const { id } = await enter(deps, visitor);
  return deps.database.write(async (transaction) => {
    await work(id, transaction);
    return read(deps, id, transaction);
  });
}

/** The copy, for who may be in its room: it is open, they are not of the team that lent it, and have shown the key. */
export async function enter(deps: ReadingDeps, visitor: CopyVisitor): Promise<CopyModel> {
  const { row, isLender } = await getOpenCopy(deps, visitor);
  if (isLender) throw noCopy();
  if (!hasKey(deps, row, visitor)) {
    throw new AppError(403, 'key-needed', 'These questions open with the key that your team set for them.');
  }
  return row;
}

function hasKey({ copyPasses }: ReadingDeps, { id }: CopyModel, { passes }: CopyVisitor): boolean {
  return copyPasses.isValid('room', id, passes.room);
}

async function read(
  { database }: ReadingDeps,
  copyId: string,
  transaction: Transaction | null,
): Promise<Questions> {
  const { copyRooms, copyQuestions } = database.models;
  const room = await copyRooms.findByPk(copyId, { raw: true, transaction });
  const rows = await copyQuestions.findAll({
    where: { copyId },
    order: [['position', 'ASC']],
    raw: true,
    transaction,
  });
  return {
    seconds: room?.seconds ?? USUAL_SECONDS,
    questions: rows.map(({ id, text, about, seconds }) => ({
      id,
      text,
      about: about === null ? null : questionAboutSchema.parse(JSON.parse(about)),
      seconds,
    })),
  };
}

async function putInOrder(
  { database }: ReadingDeps,
  copyId: string,
  transaction: Transaction,
  moved: { readonly id: string; readonly place: number } | null,
): Promise<void> {
  const { copyQuestions } = database.models;
  const rows = await copyQuestions.findAll({ where: { copyId }, order: [['position', 'ASC']], transaction });
  const others = rows.filter(({ id }) => id !== moved?.id);
  const mover = rows.find(({ id }) => id === moved?.id);
  if (moved && mover) others.splice(moved.place, 0, mover);
  for (const [position, row] of others.entries()) {
    if (row.position !== position) await row.update({ position }, { transaction });
  }
}

function storedAbout(about: QuestionAbout | null): string | null {
  return about === null ? null : JSON.stringify(about);
}
