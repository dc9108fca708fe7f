import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { Role } from '#shared/contracts/session.ts';
import { fightSchema } from '#shared/contracts/teams.ts';
import type { Fight } from '#shared/contracts/teams.ts';

export interface TeamModel extends Model<InferAttributes<TeamModel>, InferCreationAttributes<TeamModel>> {
  id: string;
  slug: string;
  name: string;
  university: string;
  isDemo: boolean;
  seasonFrom: string;
  seasonTo: string;
}

export function defineTeams(sequelize: Sequelize) {
  return sequelize.define<TeamModel>('teams', {
    id: { type: DataTypes.STRING, primaryKey: true },
    slug: DataTypes.STRING,
    name: DataTypes.STRING,
    university: DataTypes.STRING,
    isDemo: DataTypes.BOOLEAN,
    seasonFrom: DataTypes.STRING,
    seasonTo: DataTypes.STRING,
  });
}

export interface MembershipModel extends Model<
  InferAttributes<MembershipModel>,
  InferCreationAttributes<MembershipModel>
> {
  teamId: string;
  userId: string;
  role: Role;
  /** Order in which the team lists its people. */
  position: number;
}

export function defineMemberships(sequelize: Sequelize) {
  return sequelize.define<MembershipModel>('memberships', {
    teamId: { type: DataTypes.STRING, primaryKey: true },
    userId: { type: DataTypes.STRING, primaryKey: true },
    role: DataTypes.STRING,
    position: DataTypes.INTEGER,
  });
}

export interface FightModel extends Model<InferAttributes<FightModel>, InferCreationAttributes<FightModel>> {
  id: string;
  teamId: string;
  name: string;
  at: string;
  place: CreationOptional<string | null>;
  result: CreationOptional<string | null>;
  /** JSON of the contract's stages. */
  stages: string;
  eventId: CreationOptional<string | null>;
  rowVersion: CreationOptional<number>;
}

export function defineFights(sequelize: Sequelize) {
  return sequelize.define<FightModel>('fights', {
    id: { type: DataTypes.STRING, primaryKey: true },
    teamId: DataTypes.STRING,
    name: DataTypes.STRING,
    at: DataTypes.STRING,
    place: DataTypes.STRING,
    result: DataTypes.STRING,
    stages: DataTypes.TEXT,
    eventId: DataTypes.STRING,
    rowVersion: { type: DataTypes.INTEGER, defaultValue: 1 },
  });
}

export function toFight(row: FightModel): Fight {
  return fightSchema.parse({
    id: row.id,
    name: row.name,
    at: row.at,
    stages: JSON.parse(row.stages),
    ...(row.place === null ? {} : { place: row.place }),
    ...(row.result === null ? {} : { result: row.result }),
    ...(row.eventId === null ? {} : { event: row.eventId }),
  });
}
