import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** Which photos a report revision shows, in order, with caption and kind. */
export class ReportRevisionAttachment extends Model<
  InferAttributes<ReportRevisionAttachment>,
  InferCreationAttributes<ReportRevisionAttachment>
> {
  declare reportRevisionId: number;
  declare attachmentId: number;
  declare position: number;
  declare kind: 'display' | 'set-up' | 'rating-plate';
  declare caption: CreationOptional<string>;
}

export function initReportRevisionAttachment(sequelize: Sequelize) {
  return ReportRevisionAttachment.init(
    {
      reportRevisionId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      attachmentId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      position: { type: DataTypes.INTEGER, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      caption: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
    },
    {
      sequelize,
      modelName: 'ReportRevisionAttachment',
      tableName: 'report_revision_attachment',
      underscored: true,
      timestamps: false,
    },
  );
}
