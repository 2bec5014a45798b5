import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

/** Which traces a report revision rests on. */
export class ReportRevisionTrace extends Model<
  InferAttributes<ReportRevisionTrace>,
  InferCreationAttributes<ReportRevisionTrace>
> {
  declare reportRevisionId: number;
  declare traceId: number;
}

export function initReportRevisionTrace(sequelize: Sequelize) {
  return ReportRevisionTrace.init(
    {
      reportRevisionId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      traceId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
    },
    {
      sequelize,
      modelName: 'ReportRevisionTrace',
      tableName: 'report_revision_trace',
      underscored: true,
      timestamps: false,
    },
  );
}
