import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';

/** A report's state as it was last drawn together; what came since stands in report_updates. */
export interface ReportDocModel extends Model<
  InferAttributes<ReportDocModel>,
  InferCreationAttributes<ReportDocModel>
> {
  problemId: string;
  /** Made with the document: a browser's own copy of another document is never mixed into this one. */
  lineage: string;
  schemaVersion: number;
  /** One encoded Yjs update. */
  state: Buffer;
  updatedAt: string;
}

export function defineReportDocs(sequelize: Sequelize) {
  return sequelize.define<ReportDocModel>('report_docs', {
    problemId: { type: DataTypes.STRING, primaryKey: true },
    lineage: DataTypes.STRING,
    schemaVersion: DataTypes.INTEGER,
    state: DataTypes.BLOB('long'),
    updatedAt: DataTypes.STRING,
  });
}

/** One update of a report, written before it was acknowledged. */
export interface ReportUpdateModel extends Model<
  InferAttributes<ReportUpdateModel>,
  InferCreationAttributes<ReportUpdateModel>
> {
  id: CreationOptional<number>;
  problemId: string;
  userId: string | null;
  at: string;
  data: Buffer;
}

export function defineReportUpdates(sequelize: Sequelize) {
  return sequelize.define<ReportUpdateModel>('report_updates', {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    problemId: DataTypes.STRING,
    userId: DataTypes.STRING,
    at: DataTypes.STRING,
    data: DataTypes.BLOB,
  });
}
