import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** off, standby, idle, active … with its definition. */
export class OperatingMode extends Model<InferAttributes<OperatingMode>, InferCreationAttributes<OperatingMode>> {
  declare id: CreationOptional<number>;
  declare code: string;
  declare name: string;
  declare definition: string;
}

export function initOperatingMode(sequelize: Sequelize) {
  return OperatingMode.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      code: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      definition: { type: DataTypes.TEXT, allowNull: false },
    },
    { sequelize, modelName: 'OperatingMode', tableName: 'operating_mode', underscored: true, timestamps: false },
  );
}
