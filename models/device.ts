import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A maker’s model. */
export class Device extends Model<InferAttributes<Device>, InferCreationAttributes<Device>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare categoryId: number;
  declare makerId: number;
  declare model: string;
  declare state: CreationOptional<'new' | 'confirmed' | 'merged' | 'refused'>;
  declare mergedIntoId: CreationOptional<number | null>;
  declare proposedById: CreationOptional<number | null>;
  declare createdAt: Date;
}

export function initDevice(sequelize: Sequelize) {
  return Device.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      categoryId: { type: DataTypes.INTEGER, allowNull: false },
      makerId: { type: DataTypes.INTEGER, allowNull: false },
      model: { type: DataTypes.CITEXT, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'new' },
      mergedIntoId: { type: DataTypes.INTEGER },
      proposedById: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Device', tableName: 'device', underscored: true, timestamps: false },
  );
}
