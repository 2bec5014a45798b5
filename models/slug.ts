import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** An address that was given once and is never given again. */
export class Slug extends Model<InferAttributes<Slug>, InferCreationAttributes<Slug>> {
  declare slug: string;
  declare targetKind: 'category' | 'device' | 'maker' | 'guide';
  declare targetId: number;
  declare current: CreationOptional<boolean>;
  declare createdAt: Date;
}

export function initSlug(sequelize: Sequelize) {
  return Slug.init(
    {
      slug: { type: DataTypes.TEXT, allowNull: false, primaryKey: true },
      targetKind: { type: DataTypes.TEXT, allowNull: false },
      targetId: { type: DataTypes.INTEGER, allowNull: false },
      current: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: true },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Slug', tableName: 'slug', underscored: true, timestamps: false },
  );
}
