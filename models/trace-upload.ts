import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A logger’s file as it came; traces are read from it. */
export class TraceUpload extends Model<InferAttributes<TraceUpload>, InferCreationAttributes<TraceUpload>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare memberId: number;
  declare fileName: string;
  declare fileHash: string;
  declare fileBytes: number;
  declare storedFile: string;
  declare createdAt: Date;
}

export function initTraceUpload(sequelize: Sequelize) {
  return TraceUpload.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      fileName: { type: DataTypes.TEXT, allowNull: false },
      fileHash: { type: DataTypes.TEXT, allowNull: false },
      fileBytes: { type: DataTypes.INTEGER, allowNull: false },
      storedFile: { type: DataTypes.TEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'TraceUpload', tableName: 'trace_upload', underscored: true, timestamps: false },
  );
}
