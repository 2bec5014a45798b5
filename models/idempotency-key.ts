import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

/** The answer to a request that may come twice. */
export class IdempotencyKey extends Model<InferAttributes<IdempotencyKey>, InferCreationAttributes<IdempotencyKey>> {
  declare memberId: number;
  declare key: string;
  declare requestHash: string;
  declare status: number;
  declare response: object;
  declare createdAt: Date;
}

export function initIdempotencyKey(sequelize: Sequelize) {
  return IdempotencyKey.init(
    {
      memberId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      key: { type: DataTypes.TEXT, allowNull: false, primaryKey: true },
      requestHash: { type: DataTypes.TEXT, allowNull: false },
      status: { type: DataTypes.INTEGER, allowNull: false },
      response: { type: DataTypes.JSONB, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'IdempotencyKey', tableName: 'idempotency_key', underscored: true, timestamps: false },
  );
}
