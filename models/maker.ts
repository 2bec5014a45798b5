import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A manufacturer. */
export class Maker extends Model<InferAttributes<Maker>, InferCreationAttributes<Maker>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare name: string;
  declare createdAt: Date;
}

export function initMaker(sequelize: Sequelize) {
  return Maker.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.CITEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Maker', tableName: 'maker', underscored: true, timestamps: false },
  );
}
