import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A remark pinned to a field of the report. */
export class ReviewRemark extends Model<InferAttributes<ReviewRemark>, InferCreationAttributes<ReviewRemark>> {
  declare id: CreationOptional<number>;
  declare reviewId: number;
  declare pointer: string;
  declare remark: string;
}

export function initReviewRemark(sequelize: Sequelize) {
  return ReviewRemark.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      reviewId: { type: DataTypes.INTEGER, allowNull: false },
      pointer: { type: DataTypes.TEXT, allowNull: false },
      remark: { type: DataTypes.TEXT, allowNull: false },
    },
    { sequelize, modelName: 'ReviewRemark', tableName: 'review_remark', underscored: true, timestamps: false },
  );
}
