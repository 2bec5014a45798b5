import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A generation or regional version of a device. */
export class Variant extends Model<InferAttributes<Variant>, InferCreationAttributes<Variant>> {
  declare id: CreationOptional<number>;
  declare deviceId: number;
  declare generation: string;
  declare region: CreationOptional<string | null>;
  declare ratedWatts: CreationOptional<number | null>;
  declare ratedSupply: CreationOptional<string | null>;
  declare createdAt: Date;
}

export function initVariant(sequelize: Sequelize) {
  return Variant.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      deviceId: { type: DataTypes.INTEGER, allowNull: false },
      generation: { type: DataTypes.TEXT, allowNull: false },
      region: { type: DataTypes.TEXT },
      ratedWatts: { type: DataTypes.DOUBLE },
      ratedSupply: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Variant', tableName: 'variant', underscored: true, timestamps: false },
  );
}
