import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A moderator’s verdict on a report revision; only ever inserted. */
export class Review extends Model<InferAttributes<Review>, InferCreationAttributes<Review>> {
  declare id: CreationOptional<number>;
  declare reportId: number;
  declare reportRevisionId: number;
  declare authorId: number;
  declare reviewerId: number;
  declare slot: 'first' | 'second';
  declare verdict: 'verified' | 'changes-requested' | 'declined';
  declare checklist: object;
  declare reason: CreationOptional<string>;
  declare createdAt: Date;
}

export function initReview(sequelize: Sequelize) {
  return Review.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      reportId: { type: DataTypes.INTEGER, allowNull: false },
      reportRevisionId: { type: DataTypes.INTEGER, allowNull: false },
      authorId: { type: DataTypes.INTEGER, allowNull: false },
      reviewerId: { type: DataTypes.INTEGER, allowNull: false },
      slot: { type: DataTypes.TEXT, allowNull: false },
      verdict: { type: DataTypes.TEXT, allowNull: false },
      checklist: { type: DataTypes.JSONB, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Review', tableName: 'review', underscored: true, timestamps: false },
  );
}
