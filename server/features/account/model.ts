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
  /** Looks after the installation. */
  isAdministrator: CreationOptional<boolean>;
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
    isAdministrator: { type: DataTypes.BOOLEAN, defaultValue: false },
  });
}

/** A link that opens one thing once: the set-up of the installation, or a new passphrase. Only its hash is kept. */
export interface TokenModel extends Model<InferAttributes<TokenModel>, InferCreationAttributes<TokenModel>> {
  tokenHash: string;
  kind: 'setup' | 'reset';
  /** Whose passphrase it is for; null for the set-up. */
  userId: string | null;
  expiresAt: string;
}

export function defineTokens(sequelize: Sequelize) {
  return sequelize.define<TokenModel>('tokens', {
    tokenHash: { type: DataTypes.STRING, primaryKey: true },
    kind: DataTypes.STRING,
    userId: DataTypes.STRING,
    expiresAt: DataTypes.STRING,
  });
}
