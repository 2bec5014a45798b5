import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** Mail that is owed; a worker sends it after the commit. */
export class Outbox extends Model<InferAttributes<Outbox>, InferCreationAttributes<Outbox>> {
  declare id: CreationOptional<number>;
  declare messageId: string;
  declare toAddress: string;
  declare subject: string;
  declare bodyText: string;
  declare bodyHtml: string;
  declare attempts: CreationOptional<number>;
  declare notBefore: Date;
  declare sentAt: CreationOptional<Date | null>;
  declare lastError: CreationOptional<string | null>;
  declare createdAt: Date;
}

export function initOutbox(sequelize: Sequelize) {
  return Outbox.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      messageId: { type: DataTypes.TEXT, allowNull: false },
      toAddress: { type: DataTypes.TEXT, allowNull: false },
      subject: { type: DataTypes.TEXT, allowNull: false },
      bodyText: { type: DataTypes.TEXT, allowNull: false },
      bodyHtml: { type: DataTypes.TEXT, allowNull: false },
      attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      notBefore: { type: DataTypes.DATE, allowNull: false },
      sentAt: { type: DataTypes.DATE },
      lastError: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Outbox', tableName: 'outbox', underscored: true, timestamps: false },
  );
}
