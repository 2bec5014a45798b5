import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** Duty, basis, pooling and conditions of a category, as kept. */
export class CategoryRevision extends Model<
  InferAttributes<CategoryRevision>,
  InferCreationAttributes<CategoryRevision>
> {
  declare id: CreationOptional<number>;
  declare categoryId: number;
  declare n: number;
  declare summary: string;
  declare duty: 'continuous' | 'cyclic' | 'per-use' | 'modulating';
  declare basisQuantity: 'mean-power' | 'day-energy' | 'use-energy';
  declare basisModeId: CreationOptional<number | null>;
  declare poolsVariants: boolean;
  declare poolsSupplies: boolean;
  declare unitSpread: number;
  declare mayBeSwitchedOff: boolean;
  declare usePattern: object;
  declare conditions: object;
  declare cautions: object;
  declare authorId: CreationOptional<number | null>;
  declare createdAt: Date;
}

export function initCategoryRevision(sequelize: Sequelize) {
  return CategoryRevision.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      categoryId: { type: DataTypes.INTEGER, allowNull: false },
      n: { type: DataTypes.INTEGER, allowNull: false },
      summary: { type: DataTypes.TEXT, allowNull: false },
      duty: { type: DataTypes.TEXT, allowNull: false },
      basisQuantity: { type: DataTypes.TEXT, allowNull: false },
      basisModeId: { type: DataTypes.INTEGER },
      poolsVariants: { type: DataTypes.BOOLEAN, allowNull: false },
      poolsSupplies: { type: DataTypes.BOOLEAN, allowNull: false },
      unitSpread: { type: DataTypes.DOUBLE, allowNull: false },
      mayBeSwitchedOff: { type: DataTypes.BOOLEAN, allowNull: false },
      usePattern: { type: DataTypes.JSONB, allowNull: false },
      conditions: { type: DataTypes.JSONB, allowNull: false },
      cautions: { type: DataTypes.JSONB, allowNull: false },
      authorId: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'CategoryRevision', tableName: 'category_revision', underscored: true, timestamps: false },
  );
}
