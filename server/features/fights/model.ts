import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import { eventSchema } from '#shared/talk/event.ts';
import type { KeptEvent, KeptFight } from '#shared/contracts/fights.ts';
import { toFight } from '#server/features/teams/service.ts';

export interface EventModel extends Model<InferAttributes<EventModel>, InferCreationAttributes<EventModel>> {
  id: string;
  teamId: string;
  /** JSON of the event's settings. */
  content: string;
  rowVersion: CreationOptional<number>;
}

export function defineEvents(sequelize: Sequelize) {
  return sequelize.define<EventModel>('events', {
    id: { type: DataTypes.STRING, primaryKey: true },
    teamId: DataTypes.STRING,
    content: DataTypes.TEXT,
    rowVersion: { type: DataTypes.INTEGER, defaultValue: 1 },
  });
}

export function toKeptEvent(row: EventModel): KeptEvent {
  return { ...eventSchema.parse(JSON.parse(row.content)), id: row.id, rowVersion: row.rowVersion };
}

export function toKeptFight(row: Parameters<typeof toFight>[0] & { readonly rowVersion: number }): KeptFight {
  return { ...toFight(row), rowVersion: row.rowVersion };
}
