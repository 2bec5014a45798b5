import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** One member’s measurement of one device; its content stands in its revisions. */
export class Report extends Model<InferAttributes<Report>, InferCreationAttributes<Report>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare memberId: number;
  declare deviceId: number;
  declare variantId: CreationOptional<number | null>;
  declare unitId: CreationOptional<number | null>;
  declare clientKey: string;
  declare state:
    'draft' | 'submitted' | 'second-review' | 'changes-requested' | 'verified' | 'declined' | 'withdrawn' | 'lapsed';
  declare pendingRevisionId: CreationOptional<number | null>;
  declare publishedRevisionId: CreationOptional<number | null>;
  declare createdAt: Date;
  declare submittedAt: CreationOptional<Date | null>;
  declare decidedAt: CreationOptional<Date | null>;
  declare withdrawalReason: CreationOptional<string | null>;
}

export function initReport(sequelize: Sequelize) {
  return Report.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      deviceId: { type: DataTypes.INTEGER, allowNull: false },
      variantId: { type: DataTypes.INTEGER },
      unitId: { type: DataTypes.INTEGER },
      clientKey: { type: DataTypes.TEXT, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false },
      pendingRevisionId: { type: DataTypes.INTEGER },
      publishedRevisionId: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      submittedAt: { type: DataTypes.DATE },
      decidedAt: { type: DataTypes.DATE },
      withdrawalReason: { type: DataTypes.TEXT },
    },
    { sequelize, modelName: 'Report', tableName: 'report', underscored: true, timestamps: false },
  );
}
