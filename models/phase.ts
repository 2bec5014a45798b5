import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A stretch of a report in one operating mode. */
export class Phase extends Model<InferAttributes<Phase>, InferCreationAttributes<Phase>> {
  declare id: CreationOptional<number>;
  declare reportRevisionId: number;
  declare position: number;
  declare modeId: number;
  declare source: 'typed' | 'trace';
  declare startsAt: CreationOptional<Date | null>;
  declare endsAt: CreationOptional<Date | null>;
  declare durationSeconds: number;
  declare meanWatts: CreationOptional<number | null>;
  declare minimumWatts: CreationOptional<number | null>;
  declare maximumWatts: CreationOptional<number | null>;
  declare energyWattHours: CreationOptional<number | null>;
  declare uses: CreationOptional<number | null>;
  declare note: CreationOptional<string>;
}

export function initPhase(sequelize: Sequelize) {
  return Phase.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      reportRevisionId: { type: DataTypes.INTEGER, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      modeId: { type: DataTypes.INTEGER, allowNull: false },
      source: { type: DataTypes.TEXT, allowNull: false },
      startsAt: { type: DataTypes.DATE },
      endsAt: { type: DataTypes.DATE },
      durationSeconds: { type: DataTypes.DOUBLE, allowNull: false },
      meanWatts: { type: DataTypes.DOUBLE },
      minimumWatts: { type: DataTypes.DOUBLE },
      maximumWatts: { type: DataTypes.DOUBLE },
      energyWattHours: { type: DataTypes.DOUBLE },
      uses: { type: DataTypes.INTEGER },
      note: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
    },
    { sequelize, modelName: 'Phase', tableName: 'phase', underscored: true, timestamps: false },
  );
}
