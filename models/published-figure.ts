import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** What the aggregation publishes; written by lib/figures alone. */
export class PublishedFigure extends Model<InferAttributes<PublishedFigure>, InferCreationAttributes<PublishedFigure>> {
  declare id: CreationOptional<number>;
  declare scopeId: number;
  declare variantId: CreationOptional<number | null>;
  declare modeId: CreationOptional<number | null>;
  declare quantity: string;
  declare powerKind: 'real' | 'apparent';
  declare supplyStratum: 'ac-any' | 'ac-230' | 'ac-120' | 'dc';
  declare n: number;
  declare median: CreationOptional<number | null>;
  declare medianLow: CreationOptional<number | null>;
  declare lowerQuartile: CreationOptional<number | null>;
  declare upperQuartile: CreationOptional<number | null>;
  declare minimum: CreationOptional<number | null>;
  declare maximum: CreationOptional<number | null>;
  declare intervalLow: CreationOptional<number | null>;
  declare intervalHigh: CreationOptional<number | null>;
  declare intervalCoverage: CreationOptional<number | null>;
  declare tenthPercentile: CreationOptional<number | null>;
  declare ninetiethPercentile: CreationOptional<number | null>;
  declare atMost: boolean;
  declare standardUncertainty: CreationOptional<number | null>;
  declare degreesOfFreedom: CreationOptional<number | null>;
  declare flagged: number;
  declare setAside: number;
  declare devices: number;
  declare contributors: number;
  declare instruments: number;
  declare reports: number;
  declare ruleVersion: string;
  declare receiptHash: string;
  declare changedAt: Date;
}

export function initPublishedFigure(sequelize: Sequelize) {
  return PublishedFigure.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      scopeId: { type: DataTypes.INTEGER, allowNull: false },
      variantId: { type: DataTypes.INTEGER },
      modeId: { type: DataTypes.INTEGER },
      quantity: { type: DataTypes.TEXT, allowNull: false },
      powerKind: { type: DataTypes.TEXT, allowNull: false },
      supplyStratum: { type: DataTypes.TEXT, allowNull: false },
      n: { type: DataTypes.INTEGER, allowNull: false },
      median: { type: DataTypes.DOUBLE },
      medianLow: { type: DataTypes.DOUBLE },
      lowerQuartile: { type: DataTypes.DOUBLE },
      upperQuartile: { type: DataTypes.DOUBLE },
      minimum: { type: DataTypes.DOUBLE },
      maximum: { type: DataTypes.DOUBLE },
      intervalLow: { type: DataTypes.DOUBLE },
      intervalHigh: { type: DataTypes.DOUBLE },
      intervalCoverage: { type: DataTypes.DOUBLE },
      tenthPercentile: { type: DataTypes.DOUBLE },
      ninetiethPercentile: { type: DataTypes.DOUBLE },
      atMost: { type: DataTypes.BOOLEAN, allowNull: false },
      standardUncertainty: { type: DataTypes.DOUBLE },
      degreesOfFreedom: { type: DataTypes.DOUBLE },
      flagged: { type: DataTypes.INTEGER, allowNull: false },
      setAside: { type: DataTypes.INTEGER, allowNull: false },
      devices: { type: DataTypes.INTEGER, allowNull: false },
      contributors: { type: DataTypes.INTEGER, allowNull: false },
      instruments: { type: DataTypes.INTEGER, allowNull: false },
      reports: { type: DataTypes.INTEGER, allowNull: false },
      ruleVersion: { type: DataTypes.TEXT, allowNull: false },
      receiptHash: { type: DataTypes.TEXT, allowNull: false },
      changedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PublishedFigure', tableName: 'published_figure', underscored: true, timestamps: false },
  );
}
