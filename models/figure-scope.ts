import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** The row a recomputation locks: one a device, one a category. */
export class FigureScope extends Model<InferAttributes<FigureScope>, InferCreationAttributes<FigureScope>> {
  declare id: CreationOptional<number>;
  declare kind: 'device' | 'category';
  declare deviceId: CreationOptional<number | null>;
  declare categoryId: CreationOptional<number | null>;
}

export function initFigureScope(sequelize: Sequelize) {
  return FigureScope.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      kind: { type: DataTypes.TEXT, allowNull: false },
      deviceId: { type: DataTypes.INTEGER },
      categoryId: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'FigureScope', tableName: 'figure_scope', underscored: true, timestamps: false },
  );
}
