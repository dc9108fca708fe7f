import { DataTypes } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { Edition } from '#shared/contracts/editions.ts';

/** A frozen edition. The database itself refuses to change or remove it; only its PDF may come later, once. */
export interface EditionModel extends Model<
  InferAttributes<EditionModel>,
  InferCreationAttributes<EditionModel>
> {
  id: string;
  problemId: string;
  n: number;
  frozenAt: string;
  /** Name of who froze it, as it was then. */
  frozenBy: string;
  userId: string;
  note: string;
  seal: string;
  schemaVersion: number;
  trials: number;
  tiedNumbers: number;
  /** JSON of a FrozenEdition. */
  content: string;
  pages: number | null;
  pdfSha: string | null;
  pdf: Buffer | null;
}

export function defineEditions(sequelize: Sequelize) {
  return sequelize.define<EditionModel>('editions', {
    id: { type: DataTypes.STRING, primaryKey: true },
    problemId: DataTypes.STRING,
    n: DataTypes.INTEGER,
    frozenAt: DataTypes.STRING,
    frozenBy: DataTypes.STRING,
    userId: DataTypes.STRING,
    note: DataTypes.TEXT,
    seal: DataTypes.STRING,
    schemaVersion: DataTypes.INTEGER,
    trials: DataTypes.INTEGER,
    tiedNumbers: DataTypes.INTEGER,
    content: DataTypes.TEXT,
    pages: DataTypes.INTEGER,
    pdfSha: DataTypes.STRING,
    pdf: DataTypes.BLOB('long'),
  });
}

/** What lists need: neither the content nor the PDF is read for them. */
export const LISTED = [
  'id',
  'n',
  'frozenAt',
  'frozenBy',
  'note',
  'seal',
  'trials',
  'tiedNumbers',
  'pages',
  'pdfSha',
] as const satisfies readonly (keyof InferAttributes<EditionModel>)[];

export function toEdition(row: Pick<EditionModel, (typeof LISTED)[number]>): Edition {
  return {
    n: row.n,
    at: row.frozenAt,
    by: row.frozenBy,
    note: row.note,
    seal: row.seal,
    trials: row.trials,
    tiedNumbers: row.tiedNumbers,
    pages: row.pages,
    pdfSha: row.pdfSha,
  };
}
