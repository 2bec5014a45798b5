import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

/** Which stretch of which trace a phase covers, in seconds of the trace’s own time column. */
export class PhaseTrace extends Model<InferAttributes<PhaseTrace>, InferCreationAttributes<PhaseTrace>> {
  declare phaseId: number;
  declare traceId: number;
  declare fromSeconds: number;
  declare toSeconds: number;
}

export function initPhaseTrace(sequelize: Sequelize) {
  return PhaseTrace.init(
    {
      phaseId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      traceId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      fromSeconds: { type: DataTypes.DOUBLE, allowNull: false },
      toSeconds: { type: DataTypes.DOUBLE, allowNull: false },
    },
    { sequelize, modelName: 'PhaseTrace', tableName: 'phase_trace', underscored: true, timestamps: false },
  );
}
