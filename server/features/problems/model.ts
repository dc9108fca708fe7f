import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';

export interface ProblemModel extends Model<
  InferAttributes<ProblemModel>,
  InferCreationAttributes<ProblemModel>
> {
  id: string;
  teamId: string;
  number: number;
  title: string;
  statement: string;
  /** JSON list of user ids. */
  owners: string;
  /** JSON of the problem's settings. */
  settings: string;
  rowVersion: CreationOptional<number>;
  /** Grows by one in the same transaction as every change of evidence. */
  evidenceVersion: CreationOptional<number>;
  createdAt: string;
}

export function defineProblems(sequelize: Sequelize) {
  return sequelize.define<ProblemModel>('problems', {
    id: { type: DataTypes.STRING, primaryKey: true },
    teamId: DataTypes.STRING,
    number: DataTypes.INTEGER,
    title: DataTypes.STRING,
    statement: DataTypes.TEXT,
    owners: DataTypes.TEXT,
    settings: DataTypes.TEXT,
    rowVersion: { type: DataTypes.INTEGER, defaultValue: 1 },
    evidenceVersion: { type: DataTypes.INTEGER, defaultValue: 0 },
    createdAt: DataTypes.STRING,
  });
}

export interface TaskModel extends Model<InferAttributes<TaskModel>, InferCreationAttributes<TaskModel>> {
  problemId: string;
  id: string;
  position: number;
  text: string;
}

export function defineTasks(sequelize: Sequelize) {
  return sequelize.define<TaskModel>('tasks', {
    problemId: { type: DataTypes.STRING, primaryKey: true },
    id: { type: DataTypes.STRING, primaryKey: true },
    position: DataTypes.INTEGER,
    text: DataTypes.TEXT,
  });
}
