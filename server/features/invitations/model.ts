import { DataTypes } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { Role } from '#shared/contracts/session.ts';

/** An invitation nobody has accepted yet; once accepted or withdrawn it is gone, and the audit log tells of it. */
export interface InvitationModel extends Model<
  InferAttributes<InvitationModel>,
  InferCreationAttributes<InvitationModel>
> {
  id: string;
  teamId: string;
  tokenHash: string;
  /** In lower case. */
  email: string;
  name: string;
  role: Role;
  invitedBy: string;
  invitedAt: string;
  expiresAt: string;
}

export function defineInvitations(sequelize: Sequelize) {
  return sequelize.define<InvitationModel>('invitations', {
    id: { type: DataTypes.STRING, primaryKey: true },
    teamId: DataTypes.STRING,
    tokenHash: DataTypes.STRING,
    email: DataTypes.STRING,
    name: DataTypes.STRING,
    role: DataTypes.STRING,
    invitedBy: DataTypes.STRING,
    invitedAt: DataTypes.STRING,
    expiresAt: DataTypes.STRING,
  });
}
