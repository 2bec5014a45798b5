import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A kept state of a report, chained by hash; only ever inserted. */
export class ReportRevision extends Model<InferAttributes<ReportRevision>, InferCreationAttributes<ReportRevision>> {
  declare id: CreationOptional<number>;
  declare reportId: number;
  declare n: number;
  declare schemaVersion: number;
  declare content: object;
  declare categoryRevisionId: number;
  declare methodRevisionId: number;
  declare instrumentRevisionId: number;
  declare supplyClass: 'ac-230' | 'ac-120' | 'dc';
  declare measuringPoint: 'plug' | 'circuit' | 'battery-side' | 'device-side' | 'behind-adapter';
  declare ambientCelsius: CreationOptional<number | null>;
  declare licence: 'CC-BY-4.0';
  declare previousHash: CreationOptional<string | null>;
  declare hash: string;
  declare clientKey: CreationOptional<string | null>;
  declare createdAt: Date;
}

export function initReportRevision(sequelize: Sequelize) {
  return ReportRevision.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      reportId: { type: DataTypes.INTEGER, allowNull: false },
      n: { type: DataTypes.INTEGER, allowNull: false },
      schemaVersion: { type: DataTypes.INTEGER, allowNull: false },
      content: { type: DataTypes.JSONB, allowNull: false },
      categoryRevisionId: { type: DataTypes.INTEGER, allowNull: false },
      methodRevisionId: { type: DataTypes.INTEGER, allowNull: false },
      instrumentRevisionId: { type: DataTypes.INTEGER, allowNull: false },
      supplyClass: { type: DataTypes.TEXT, allowNull: false },
      measuringPoint: { type: DataTypes.TEXT, allowNull: false },
      ambientCelsius: { type: DataTypes.DOUBLE },
      licence: { type: DataTypes.TEXT, allowNull: false },
      previousHash: { type: DataTypes.TEXT },
      hash: { type: DataTypes.TEXT, allowNull: false },
      clientKey: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'ReportRevision', tableName: 'report_revision', underscored: true, timestamps: false },
  );
}
