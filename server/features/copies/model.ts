import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { CopyReader } from '#shared/contracts/copies.ts';

/** An edition lent to a reader. Only the hash of its token is kept, so nobody can open it from the database. */
export interface CopyModel extends Model<InferAttributes<CopyModel>, InferCreationAttributes<CopyModel>> {
  id: string;
  /** The team that lends. */
  teamId: string;
  problemId: string;
  editionId: string;
  /** Within the problem. */
  number: number;
  tokenHash: string;
  recipient: string;
  /** The recipient, where it is a team of this installation. */
  recipientTeamId: string | null;
  reader: CopyReader;
  passphraseHash: string | null;
  opensAt: string;
  closesAt: string;
  mayPrint: boolean;
  lentAt: string;
  lentBy: string;
  revokedAt: CreationOptional<string | null>;
  revokedBy: CreationOptional<string | null>;
}

export function defineCopies(sequelize: Sequelize) {
  return sequelize.define<CopyModel>('copies', {
    id: { type: DataTypes.STRING, primaryKey: true },
    teamId: DataTypes.STRING,
    problemId: DataTypes.STRING,
    editionId: DataTypes.STRING,
    number: DataTypes.INTEGER,
    tokenHash: DataTypes.STRING,
    recipient: DataTypes.STRING,
    recipientTeamId: DataTypes.STRING,
    reader: DataTypes.STRING,
    passphraseHash: DataTypes.STRING,
    opensAt: DataTypes.STRING,
    closesAt: DataTypes.STRING,
    mayPrint: DataTypes.BOOLEAN,
    lentAt: DataTypes.STRING,
    lentBy: DataTypes.STRING,
    revokedAt: DataTypes.STRING,
    revokedBy: DataTypes.STRING,
  });
}

/** A copy that was opened or printed: when, never by whom or from where. */
export interface CopyViewModel extends Model<
  InferAttributes<CopyViewModel>,
  InferCreationAttributes<CopyViewModel>
> {
  id: CreationOptional<number>;
  copyId: string;
  at: string;
  kind: 'opened' | 'printed';
}

export function defineCopyViews(sequelize: Sequelize) {
  return sequelize.define<CopyViewModel>('copy_views', {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    copyId: DataTypes.STRING,
    at: DataTypes.STRING,
    kind: DataTypes.STRING,
  });
}

/** The room in which a copy's readers prepare their questions. */
export interface CopyRoomModel extends Model<
  InferAttributes<CopyRoomModel>,
  InferCreationAttributes<CopyRoomModel>
> {
  copyId: string;
  keyHash: string;
  keySetAt: string;
  /** Time allowed for all questions. */
  seconds: number;
}

export function defineCopyRooms(sequelize: Sequelize) {
  return sequelize.define<CopyRoomModel>('copy_rooms', {
    copyId: { type: DataTypes.STRING, primaryKey: true },
    keyHash: DataTypes.STRING,
    keySetAt: DataTypes.STRING,
    seconds: DataTypes.INTEGER,
  });
}

export interface CopyQuestionModel extends Model<
  InferAttributes<CopyQuestionModel>,
  InferCreationAttributes<CopyQuestionModel>
> {
  id: string;
  copyId: string;
  /** Order in which it is to be asked, from 0. */
  position: number;
  text: string;
  /** JSON of what it is about; null: nothing in particular. */
  about: string | null;
  seconds: number;
  writtenAt: string;
}

export function defineCopyQuestions(sequelize: Sequelize) {
  return sequelize.define<CopyQuestionModel>('copy_questions', {
    id: { type: DataTypes.STRING, primaryKey: true },
    copyId: DataTypes.STRING,
    position: DataTypes.INTEGER,
    text: DataTypes.TEXT,
    about: DataTypes.TEXT,
    seconds: DataTypes.INTEGER,
    writtenAt: DataTypes.STRING,
  });
}
