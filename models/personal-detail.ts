import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** What can be erased of a member. */
export class PersonalDetail extends Model<InferAttributes<PersonalDetail>, InferCreationAttributes<PersonalDetail>> {
  declare memberId: number;
  declare name: string;
  declare region: CreationOptional<string | null>;
  declare updatedAt: Date;
}

export function initPersonalDetail(sequelize: Sequelize) {
  return PersonalDetail.init(
    {
      memberId: { type: DataTypes.INTEGER, allowNull: false, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      region: { type: DataTypes.TEXT },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PersonalDetail', tableName: 'personal_detail', underscored: true, timestamps: false },
  );
}
