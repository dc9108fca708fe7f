import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { MailKind, MailState } from '#shared/contracts/people.ts';

/** A mail that is to be sent, or was. */
export interface MailModel extends Model<InferAttributes<MailModel>, InferCreationAttributes<MailModel>> {
  id: string;
  /** The team that caused it; null for what concerns a person alone, which no captain sees. */
  teamId: string | null;
  /** Id of what it is about: an invitation. */
  concerns: string | null;
  kind: MailKind | 'reset';
  address: string;
  name: string;
  subject: string;
  /** With LINK_PLACE where the link stands. */
  text: string;
  /** null once it is sent, or must not be sent any more. */
  link: string | null;
  state: CreationOptional<MailState>;
  /** Times it was tried and not taken. */
  tries: CreationOptional<number>;
  nextTryAt: string | null;
  /** Why the last try failed, in a sentence. */
  error: CreationOptional<string | null>;
  writtenAt: string;
  sentAt: CreationOptional<string | null>;
}

export function defineOutbox(sequelize: Sequelize) {
  return sequelize.define<MailModel>('outbox', {
    id: { type: DataTypes.STRING, primaryKey: true },
    teamId: DataTypes.STRING,
    concerns: DataTypes.STRING,
    kind: DataTypes.STRING,
    address: DataTypes.STRING,
    name: DataTypes.STRING,
    subject: DataTypes.STRING,
    text: DataTypes.TEXT,
    link: DataTypes.STRING,
    state: { type: DataTypes.STRING, defaultValue: 'waiting' },
    tries: { type: DataTypes.INTEGER, defaultValue: 0 },
    nextTryAt: DataTypes.STRING,
    error: DataTypes.STRING,
    writtenAt: DataTypes.STRING,
    sentAt: DataTypes.STRING,
  });
}
