import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A recorded series: the file as it came, the normalised series, and levels for drawing. */
export class Trace extends Model<InferAttributes<Trace>, InferCreationAttributes<Trace>> {
  declare id: CreationOptional<number>;
  declare publicId: string;
  declare memberId: number;
  declare uploadId: number;
  declare fileName: string;
  declare fileHash: string;
  declare fileBytes: number;
  declare storedFile: string;
  declare storedSeries: string;
  declare kind: 'samples' | 'averages' | 'changes' | 'counter';
  declare powerKind: 'real' | 'apparent';
  declare zone: string;
  declare description: object;
  declare corrections: object;
  declare importerVersion: string;
  declare samples: number;
  declare startsAt: Date;
  declare endsAt: Date;
  declare averagingSeconds: CreationOptional<number | null>;
  declare step: number;
  declare levels: object;
  declare createdAt: Date;
}

export function initTrace(sequelize: Sequelize) {
  return Trace.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publicId: { type: DataTypes.TEXT, allowNull: false },
      memberId: { type: DataTypes.INTEGER, allowNull: false },
      uploadId: { type: DataTypes.INTEGER, allowNull: false },
      fileName: { type: DataTypes.TEXT, allowNull: false },
      fileHash: { type: DataTypes.TEXT, allowNull: false },
      fileBytes: { type: DataTypes.INTEGER, allowNull: false },
      storedFile: { type: DataTypes.TEXT, allowNull: false },
      storedSeries: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      powerKind: { type: DataTypes.TEXT, allowNull: false },
      zone: { type: DataTypes.TEXT, allowNull: false },
      description: { type: DataTypes.JSONB, allowNull: false },
      corrections: { type: DataTypes.JSONB, allowNull: false },
      importerVersion: { type: DataTypes.TEXT, allowNull: false },
      samples: { type: DataTypes.INTEGER, allowNull: false },
      startsAt: { type: DataTypes.DATE, allowNull: false },
      endsAt: { type: DataTypes.DATE, allowNull: false },
      averagingSeconds: { type: DataTypes.DOUBLE },
      step: { type: DataTypes.DOUBLE, allowNull: false },
      levels: { type: DataTypes.JSONB, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Trace', tableName: 'trace', underscored: true, timestamps: false },
  );
}
