import { DataTypes } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { LeakName } from '#shared/leaks/leak.ts';
import type { LeakAnswer, LeakMark } from '#shared/leaks/prepared-leak.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';

/** What the team says to a leak. */
export interface LeakAnswerModel extends Model<
  InferAttributes<LeakAnswerModel>,
  InferCreationAttributes<LeakAnswerModel>
> {
  problemId: string;
  leak: string;
  text: string;
  /** Name of who wrote it. */
  by: string;
  userId: string;
  at: string;
  basis: string;
}

export function defineLeakAnswers(sequelize: Sequelize) {
  return sequelize.define<LeakAnswerModel>('leak_answers', {
    problemId: { type: DataTypes.STRING, primaryKey: true },
    leak: { type: DataTypes.STRING, primaryKey: true },
    text: DataTypes.TEXT,
    by: DataTypes.STRING,
    userId: DataTypes.STRING,
    at: DataTypes.STRING,
    basis: DataTypes.TEXT,
  });
}

/** A leak as it was last found. */
export interface LeakMarkModel extends Model<
  InferAttributes<LeakMarkModel>,
  InferCreationAttributes<LeakMarkModel>
> {
  problemId: string;
  leak: string;
  name: LeakName;
  section: SectionName;
  question: string;
  evidence: string;
}

export function defineLeakMarks(sequelize: Sequelize) {
  return sequelize.define<LeakMarkModel>('leak_marks', {
    problemId: { type: DataTypes.STRING, primaryKey: true },
    leak: { type: DataTypes.STRING, primaryKey: true },
    name: DataTypes.STRING,
    section: DataTypes.STRING,
    question: DataTypes.TEXT,
    evidence: DataTypes.TEXT,
  });
}

export function toLeakAnswer({ leak, text, by, at, basis }: LeakAnswerModel): LeakAnswer {
  return { leak, text, by, at, basis };
}

export function toLeakMark({ leak, name, section, question, evidence }: LeakMarkModel): LeakMark {
  return { leak, name, section, question, evidence };
}
