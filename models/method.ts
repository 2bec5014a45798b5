import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A written procedure. */
export class Method extends Model<InferAttributes<Method>, InferCreationAttributes<Method>> {
  declare id: CreationOptional<number>;
  declare code: string;
  declare currentRevisionId: CreationOptional<number | null>;
}

export function initMethod(sequelize: Sequelize) {
  return Method.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      code: { type: DataTypes.TEXT, allowNull: false },
      currentRevisionId: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Method', tableName: 'method', underscored: true, timestamps: false },
  );
}
