import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';

export interface TrialModel extends Model<InferAttributes<TrialModel>, InferCreationAttributes<TrialModel>> {
  problemId: string;
  /** Made by the client. */
  id: string;
  seriesId: string;
  number: number;
  runOrder: number;
  userId: string;
  by: string;
  at: string;
  /** JSON: quantity id → reading. */
  values: string;
  note: CreationOptional<string | null>;
  /** JSON of who, when and why; null while it counts. */
  excluded: CreationOptional<string | null>;
  /** JSON of who and when; null while it stands. */
  withdrawn: CreationOptional<string | null>;
  /** Version of the evidence in which it was logged. */
  loggedVersion: number;
}

export function defineTrials(sequelize: Sequelize) {
  return sequelize.define<TrialModel>('trials', {
    problemId: { type: DataTypes.STRING, primaryKey: true },
    id: { type: DataTypes.STRING, primaryKey: true },
    seriesId: DataTypes.STRING,
    number: DataTypes.INTEGER,
    runOrder: DataTypes.INTEGER,
    userId: DataTypes.STRING,
    by: DataTypes.STRING,
    at: DataTypes.STRING,
    values: DataTypes.TEXT,
    note: DataTypes.TEXT,
    excluded: DataTypes.TEXT,
    withdrawn: DataTypes.TEXT,
    loggedVersion: DataTypes.INTEGER,
  });
}
