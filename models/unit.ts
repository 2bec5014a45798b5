import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A physical specimen of a device. */
export class Unit extends Model<InferAttributes<Unit>, InferCreationAttributes<Unit>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare deviceId: number;
  declare label: string;
  declare registeredById: number;
  declare createdAt: Date;
}

export function initUnit(sequelize: Sequelize) {
  return Unit.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      deviceId: { type: DataTypes.INTEGER, allowNull: false },
      label: { type: DataTypes.TEXT, allowNull: false },
      registeredById: { type: DataTypes.INTEGER, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Unit', tableName: 'unit', underscored: true, timestamps: false },
  );
}
