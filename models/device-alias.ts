import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** Another name that a device goes by. */
export class DeviceAlias extends Model<InferAttributes<DeviceAlias>, InferCreationAttributes<DeviceAlias>> {
  declare id: CreationOptional<number>;
  declare deviceId: number;
  declare name: string;
  declare createdAt: Date;
}

export function initDeviceAlias(sequelize: Sequelize) {
  return DeviceAlias.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      deviceId: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.CITEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'DeviceAlias', tableName: 'device_alias', underscored: true, timestamps: false },
  );
}
