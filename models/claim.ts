import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** What the maker states of a device; its content stands in its current revision. */
export class Claim extends Model<InferAttributes<Claim>, InferCreationAttributes<Claim>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare deviceId: number;
  declare variantId: CreationOptional<number | null>;
  declare state: CreationOptional<'in-force' | 'disputed' | 'superseded'>;
  declare currentRevisionId: CreationOptional<number | null>;
  declare createdAt: Date;
}

export function initClaim(sequelize: Sequelize) {
  return Claim.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      deviceId: { type: DataTypes.INTEGER, allowNull: false },
      variantId: { type: DataTypes.INTEGER },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'in-force' },
      currentRevisionId: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Claim', tableName: 'claim', underscored: true, timestamps: false },
  );
}
