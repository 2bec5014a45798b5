import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** What a member is still writing; the version counter tells two editors apart. */
export class ReportDraft extends Model<InferAttributes<ReportDraft>, InferCreationAttributes<ReportDraft>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare memberId: number;
  declare reportId: CreationOptional<number | null>;
  declare content: object;
  declare version: CreationOptional<number>;
  declare createdAt: Date;
  declare updatedAt: Date;
  declare sentAt: CreationOptional<Date | null>;
}

export function initReportDraft(sequelize: Sequelize) {
  return ReportDraft.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      reportId: { type: DataTypes.INTEGER },
      content: { type: DataTypes.JSONB, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
      sentAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: 'ReportDraft', tableName: 'report_draft', underscored: true, timestamps: false },
  );
}
