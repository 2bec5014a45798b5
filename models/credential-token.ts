import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A link that was mailed: for one purpose, once, until it expires. */
export class CredentialToken extends Model<InferAttributes<CredentialToken>, InferCreationAttributes<CredentialToken>> {
  declare id: CreationOptional<number>;
  declare memberId: number;
  declare purpose: 'confirm-address' | 'reset-password' | 'change-address';
  declare tokenHash: string;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare createdAt: Date;
}

export function initCredentialToken(sequelize: Sequelize) {
  return CredentialToken.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      purpose: { type: DataTypes.TEXT, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      usedAt: { type: DataTypes.DATE },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'CredentialToken', tableName: 'credential_token', underscored: true, timestamps: false },
  );
}
