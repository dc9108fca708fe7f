import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';

/**
 * A definition as it was entered: an instrument, quantity, series, model, comparison, claim or chart. Ids are unique
 * within a problem. A removed row stays, so that its number or letter is never given again.
 */
export interface DefinitionModel extends Model<
  InferAttributes<DefinitionModel>,
  InferCreationAttributes<DefinitionModel>
> {
  problemId: string;
  id: string;
  /** Order in the register; also the number of a model, claim or chart, and the place of a series' letter. */
  position: number;
  /** JSON of the row, without nothing: what the evidence holds. */
  content: string;
  rowVersion: CreationOptional<number>;
  removedAt: CreationOptional<string | null>;
}

export const DEFINITION_TABLES = [
  'instruments',
  'quantities',
  'series',
  'models',
  'comparisons',
  'claims',
  'charts',
] as const satisfies readonly DefinitionTable[];

function defineDefinitions(sequelize: Sequelize, table: DefinitionTable) {
  return sequelize.define<DefinitionModel>(table, {
    problemId: { type: DataTypes.STRING, primaryKey: true },
    id: { type: DataTypes.STRING, primaryKey: true },
    position: DataTypes.INTEGER,
    content: DataTypes.TEXT,
    rowVersion: { type: DataTypes.INTEGER, defaultValue: 1 },
    removedAt: DataTypes.STRING,
  });
}

export function defineAllDefinitions(sequelize: Sequelize) {
  return {
    instruments: defineDefinitions(sequelize, 'instruments'),
    quantities: defineDefinitions(sequelize, 'quantities'),
    series: defineDefinitions(sequelize, 'series'),
    models: defineDefinitions(sequelize, 'models'),
    comparisons: defineDefinitions(sequelize, 'comparisons'),
    claims: defineDefinitions(sequelize, 'claims'),
    charts: defineDefinitions(sequelize, 'charts'),
  };
}

/** One change, written with it and never altered: who changed which row when, from what to what. */
export interface AuditEventModel extends Model<
  InferAttributes<AuditEventModel>,
  InferCreationAttributes<AuditEventModel>
> {
  id: CreationOptional<number>;
  teamId: string;
  problemId: string | null;
  /** Version of the evidence after the change; null when evidence was not changed. */
  version: number | null;
  mutationId: string | null;
  userId: string | null;
  at: string;
  action: string;
  /** JSON of the changed rows as they were, by table and id. */
  before: string;
  /** JSON of the changes, as they were told to every open tab. */
  changes: string;
}

export function defineAuditEvents(sequelize: Sequelize) {
  return sequelize.define<AuditEventModel>('audit_events', {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    teamId: DataTypes.STRING,
    problemId: DataTypes.STRING,
    version: DataTypes.INTEGER,
    mutationId: DataTypes.STRING,
    userId: DataTypes.STRING,
    at: DataTypes.STRING,
    action: DataTypes.STRING,
    before: DataTypes.TEXT,
    changes: DataTypes.TEXT,
  });
}
