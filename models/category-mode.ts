import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** Which operating modes are in force in a category revision, in order. */
export class CategoryMode extends Model<InferAttributes<CategoryMode>, InferCreationAttributes<CategoryMode>> {
  declare categoryRevisionId: number;
  declare modeId: number;
  declare position: number;
  declare note: CreationOptional<string>;
}

export function initCategoryMode(sequelize: Sequelize) {
  return CategoryMode.init(
    {
      categoryRevisionId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      modeId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      position: { type: DataTypes.INTEGER, allowNull: false },
      note: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
    },
    { sequelize, modelName: 'CategoryMode', tableName: 'category_mode', underscored: true, timestamps: false },
  );
}
