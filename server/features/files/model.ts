import { DataTypes } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { PlateFile } from '#shared/contracts/report.ts';

/** A picture that a problem may show; its bytes lie on disk under their SHA-256. */
export interface FileModel extends Model<InferAttributes<FileModel>, InferCreationAttributes<FileModel>> {
  problemId: string;
  sha: string;
  type: string;
  width: number;
  height: number;
  bytes: number;
  userId: string | null;
  at: string;
}

export function defineFiles(sequelize: Sequelize) {
  return sequelize.define<FileModel>('files', {
    problemId: { type: DataTypes.STRING, primaryKey: true },
    sha: { type: DataTypes.STRING, primaryKey: true },
    type: DataTypes.STRING,
    width: DataTypes.INTEGER,
    height: DataTypes.INTEGER,
    bytes: DataTypes.INTEGER,
    userId: DataTypes.STRING,
    at: DataTypes.STRING,
  });
}

export function toPlateFile({ sha, width, height, bytes }: FileModel): PlateFile {
  return { sha, width, height, bytes };
}
