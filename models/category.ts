import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A kind of device; what it says stands in its current revision. */
export class Category extends Model<InferAttributes<Category>, InferCreationAttributes<Category>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare parentId: CreationOptional<number | null>;
  declare name: string;
  declare currentRevisionId: CreationOptional<number | null>;
  declare createdAt: Date;
}

export function initCategory(sequelize: Sequelize) {
  return Category.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      parentId: { type: DataTypes.INTEGER },
      name: { type: DataTypes.CITEXT, allowNull: false },
      currentRevisionId: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Category', tableName: 'category', underscored: true, timestamps: false },
  );
}
