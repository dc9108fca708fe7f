import { DataTypes } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';

export interface SessionModel extends Model<
  InferAttributes<SessionModel>,
  InferCreationAttributes<SessionModel>
> {
  sid: string;
  /** null while nobody is signed in. */
  userId: string | null;
  expires: Date;
  data: string;
}

export function defineSessions(sequelize: Sequelize) {
  return sequelize.define<SessionModel>('sessions', {
    sid: { type: DataTypes.STRING, primaryKey: true },
    userId: DataTypes.STRING,
    expires: DataTypes.DATE,
    data: DataTypes.TEXT,
  });
}
