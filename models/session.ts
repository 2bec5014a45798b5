import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A signed-in browser; the cookie holds a token of which only the hash stands here. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: CreationOptional<number>;
  declare memberId: number;
  declare tokenHash: string;
  declare createdAt: Date;
  declare seenAt: Date;
  declare idleEndsAt: Date;
  declare absoluteEndsAt: Date;
  declare secondFactorAt: CreationOptional<Date | null>;
  declare endedAt: CreationOptional<Date | null>;
}

export function initSession(sequelize: Sequelize) {
  return Session.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      seenAt: { type: DataTypes.DATE, allowNull: false },
      idleEndsAt: { type: DataTypes.DATE, allowNull: false },
      absoluteEndsAt: { type: DataTypes.DATE, allowNull: false },
      secondFactorAt: { type: DataTypes.DATE },
      endedAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: 'Session', tableName: 'session', underscored: true, timestamps: false },
  );
}
