import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** Stated accuracy of an instrument, as kept; reports refer to it. */
export class InstrumentRevision extends Model<
  InferAttributes<InstrumentRevision>,
  InferCreationAttributes<InstrumentRevision>
> {
  declare id: CreationOptional<number>;
  declare instrumentId: number;
  declare n: number;
  declare kind: 'plug-in-meter' | 'metering-breaker' | 'clamp' | 'dc-shunt' | 'inverter-log' | 'bench-analyser';
  declare modelName: string;
  declare percentOfReading: number;
  declare percentOfRange: number;
  declare rangeWatts: CreationOptional<number | null>;
  declare counts: number;
  declare resolutionWatts: number;
  declare resolutionWattHours: CreationOptional<number | null>;
  declare lowerLimitWatts: CreationOptional<number | null>;
  declare readsTruePower: boolean;
  declare supplies: ('ac-230' | 'ac-120' | 'dc')[];
  declare averagingSeconds: CreationOptional<number | null>;
  declare calibratedOn: CreationOptional<string | null>;
  declare createdAt: Date;
}

export function initInstrumentRevision(sequelize: Sequelize) {
  return InstrumentRevision.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      instrumentId: { type: DataTypes.INTEGER, allowNull: false },
      n: { type: DataTypes.INTEGER, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      modelName: { type: DataTypes.TEXT, allowNull: false },
      percentOfReading: { type: DataTypes.DOUBLE, allowNull: false },
      percentOfRange: { type: DataTypes.DOUBLE, allowNull: false },
      rangeWatts: { type: DataTypes.DOUBLE },
      counts: { type: DataTypes.DOUBLE, allowNull: false },
      resolutionWatts: { type: DataTypes.DOUBLE, allowNull: false },
      resolutionWattHours: { type: DataTypes.DOUBLE },
      lowerLimitWatts: { type: DataTypes.DOUBLE },
      readsTruePower: { type: DataTypes.BOOLEAN, allowNull: false },
      supplies: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
      averagingSeconds: { type: DataTypes.DOUBLE },
      calibratedOn: { type: DataTypes.DATEONLY },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    {
      sequelize,
      modelName: 'InstrumentRevision',
      tableName: 'instrument_revision',
      underscored: true,
      timestamps: false,
    },
  );
}
