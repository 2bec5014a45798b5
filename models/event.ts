import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** Who did what to which row; only ever inserted. */
export class Event extends Model<InferAttributes<Event>, InferCreationAttributes<Event>> {
  declare id: CreationOptional<string>;
  declare at: Date;
  declare actorId: CreationOptional<number | null>;
  declare action: string;
  declare subjectKind: string;
  declare subjectId: number;
  declare before: CreationOptional<object | null>;
  declare after: CreationOptional<object | null>;
  declare requestId: CreationOptional<string | null>;
}

export function initEvent(sequelize: Sequelize) {
  return Event.init(
    {
      id: { type: DataTypes.BIGINT, allowNull: false, autoIncrement: true, primaryKey: true },
      at: { type: DataTypes.DATE, allowNull: false },
      actorId: { type: DataTypes.INTEGER },
      action: { type: DataTypes.TEXT, allowNull: false },
      subjectKind: { type: DataTypes.TEXT, allowNull: false },
      subjectId: { type: DataTypes.INTEGER, allowNull: false },
      before: { type: DataTypes.JSONB },
      after: { type: DataTypes.JSONB },
      requestId: { type: DataTypes.TEXT },
    },
    { sequelize, modelName: 'Event', tableName: 'event', underscored: true, timestamps: false },
  );
}
