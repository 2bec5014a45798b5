import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A number that a report revision yields, with the parts of its uncertainty. */
export class ReportFigure extends Model<InferAttributes<ReportFigure>, InferCreationAttributes<ReportFigure>> {
  declare id: CreationOptional<number>;
  declare reportRevisionId: number;
  declare modeId: CreationOptional<number | null>;
  declare quantity:
    'mean-power' | 'minimum-power' | 'maximum-power' | 'day-energy' | 'use-energy' | 'start-extra-energy';
  declare powerKind: 'real' | 'apparent';
  declare supplyClass: 'ac-230' | 'ac-120' | 'dc';
  declare value: number;
  declare standardUncertainty: number;
  declare gain: number;
  declare offset: number;
  declare resolution: number;
  declare repeatability: number;
  declare drift: number;
  declare belowLimit: number;
  declare censoredAt: CreationOptional<number | null>;
  declare averagingSeconds: CreationOptional<number | null>;
  declare coverage: CreationOptional<number | null>;
  declare countedSeconds: number;
  declare computationVersion: string;
}

export function initReportFigure(sequelize: Sequelize) {
  return ReportFigure.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      reportRevisionId: { type: DataTypes.INTEGER, allowNull: false },
      modeId: { type: DataTypes.INTEGER },
      quantity: { type: DataTypes.TEXT, allowNull: false },
      powerKind: { type: DataTypes.TEXT, allowNull: false },
      supplyClass: { type: DataTypes.TEXT, allowNull: false },
      value: { type: DataTypes.DOUBLE, allowNull: false },
      standardUncertainty: { type: DataTypes.DOUBLE, allowNull: false },
      gain: { type: DataTypes.DOUBLE, allowNull: false },
      offset: { type: DataTypes.DOUBLE, allowNull: false },
      resolution: { type: DataTypes.DOUBLE, allowNull: false },
      repeatability: { type: DataTypes.DOUBLE, allowNull: false },
      drift: { type: DataTypes.DOUBLE, allowNull: false },
      belowLimit: { type: DataTypes.DOUBLE, allowNull: false },
      censoredAt: { type: DataTypes.DOUBLE },
      averagingSeconds: { type: DataTypes.DOUBLE },
      coverage: { type: DataTypes.DOUBLE },
      countedSeconds: { type: DataTypes.DOUBLE, allowNull: false },
      computationVersion: { type: DataTypes.TEXT, allowNull: false },
    },
    { sequelize, modelName: 'ReportFigure', tableName: 'report_figure', underscored: true, timestamps: false },
  );
}
