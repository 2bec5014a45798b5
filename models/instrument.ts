import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A member’s instrument. */
export class Instrument extends Model<InferAttributes<Instrument>, InferCreationAttributes<Instrument>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare memberId: number;
  declare name: string;
  declare currentRevisionId: CreationOptional<number | null>;
  declare retiredAt: CreationOptional<Date | null>;
  declare createdAt: Date;
}

export function initInstrument(sequelize: Sequelize) {
  return Instrument.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      currentRevisionId: { type: DataTypes.INTEGER },
      retiredAt: { type: DataTypes.DATE },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Instrument', tableName: 'instrument', underscored: true, timestamps: false },
  );
}
