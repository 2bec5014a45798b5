import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A figure that does not count, from when until when, and why. */
export class SetAside extends Model<InferAttributes<SetAside>, InferCreationAttributes<SetAside>> {
  declare id: CreationOptional<number>;
  declare reportFigureId: number;
  declare byId: number;
  declare reason: string;
  declare fromAt: Date;
  declare untilAt: CreationOptional<Date | null>;
}

export function initSetAside(sequelize: Sequelize) {
  return SetAside.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      reportFigureId: { type: DataTypes.INTEGER, allowNull: false },
      byId: { type: DataTypes.INTEGER, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
      fromAt: { type: DataTypes.DATE, allowNull: false },
      untilAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: 'SetAside', tableName: 'set_aside', underscored: true, timestamps: false },
  );
}
