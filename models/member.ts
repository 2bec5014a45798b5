import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** An account. Everything about the person stands in PersonalDetail, so that erasing someone touches one row. */
export class Member extends Model<InferAttributes<Member>, InferCreationAttributes<Member>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare email: CreationOptional<string | null>;
  declare passwordHash: CreationOptional<string | null>;
  declare role: CreationOptional<'member' | 'moderator' | 'admin'>;
  declare state: CreationOptional<'unconfirmed' | 'active' | 'suspended' | 'erased'>;
  declare confirmedAt: CreationOptional<Date | null>;
  declare erasedAt: CreationOptional<Date | null>;
  declare formerNumber: CreationOptional<number | null>;
  declare createdAt: Date;
}

export function initMember(sequelize: Sequelize) {
  return Member.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      email: { type: DataTypes.CITEXT },
      passwordHash: { type: DataTypes.TEXT },
      role: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'member' },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'unconfirmed' },
      confirmedAt: { type: DataTypes.DATE },
      erasedAt: { type: DataTypes.DATE },
      formerNumber: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Member', tableName: 'member', underscored: true, timestamps: false },
  );
}
