import { DataTypes } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';

export interface UserModel extends Model<InferAttributes<UserModel>, InferCreationAttributes<UserModel>> {
  id: string;
  /** In lower case. */
  email: string;
  name: string;
  passphraseHash: string;
  /** null while it is the one the account was made with. */
  passphraseChangedAt: CreationOptional<string | null>;
  /** Set: this person may not sign in. */
  disabledAt: CreationOptional<string | null>;
  createdAt: string;
}

export function defineUsers(sequelize: Sequelize) {
  return sequelize.define<UserModel>('users', {
    id: { type: DataTypes.STRING, primaryKey: true },
    email: DataTypes.STRING,
    name: DataTypes.STRING,
    passphraseHash: DataTypes.STRING,
    passphraseChangedAt: DataTypes.STRING,
    disabledAt: DataTypes.STRING,
    createdAt: DataTypes.STRING,
  });
}
