import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A photo, written anew in two sizes without metadata. */
export class Attachment extends Model<InferAttributes<Attachment>, InferCreationAttributes<Attachment>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare memberId: number;
  declare originalHash: string;
  declare storedLarge: string;
  declare largeWidth: number;
  declare largeHeight: number;
  declare largeBytes: number;
  declare largeHash: string;
  declare storedSmall: string;
  declare smallWidth: number;
  declare smallHeight: number;
  declare smallBytes: number;
  declare smallHash: string;
  declare removedMetadata: string[];
  declare licence: 'CC-BY-4.0';
  declare createdAt: Date;
}

export function initAttachment(sequelize: Sequelize) {
  return Attachment.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      originalHash: { type: DataTypes.TEXT, allowNull: false },
      storedLarge: { type: DataTypes.TEXT, allowNull: false },
      largeWidth: { type: DataTypes.INTEGER, allowNull: false },
      largeHeight: { type: DataTypes.INTEGER, allowNull: false },
      largeBytes: { type: DataTypes.INTEGER, allowNull: false },
      largeHash: { type: DataTypes.TEXT, allowNull: false },
      storedSmall: { type: DataTypes.TEXT, allowNull: false },
      smallWidth: { type: DataTypes.INTEGER, allowNull: false },
      smallHeight: { type: DataTypes.INTEGER, allowNull: false },
      smallBytes: { type: DataTypes.INTEGER, allowNull: false },
      smallHash: { type: DataTypes.TEXT, allowNull: false },
      removedMetadata: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
      licence: { type: DataTypes.TEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Attachment', tableName: 'attachment', underscored: true, timestamps: false },
  );
}
