import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A kept state of a method: minimum duration and cycles, caution, checklist. */
export class MethodRevision extends Model<InferAttributes<MethodRevision>, InferCreationAttributes<MethodRevision>> {
  declare id: CreationOptional<number>;
  declare methodId: number;
  declare n: number;
  declare name: string;
  declare summary: string;
  declare minimumSeconds: number;
  declare minimumCycles: CreationOptional<number>;
  declare caution: string;
  declare needsConfirmation: boolean;
  declare counts: boolean;
  declare checklist: object;
  declare createdAt: Date;
}

export function initMethodRevision(sequelize: Sequelize) {
  return MethodRevision.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      methodId: { type: DataTypes.INTEGER, allowNull: false },
      n: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      summary: { type: DataTypes.TEXT, allowNull: false },
      minimumSeconds: { type: DataTypes.DOUBLE, allowNull: false },
      minimumCycles: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      caution: { type: DataTypes.TEXT, allowNull: false },
      needsConfirmation: { type: DataTypes.BOOLEAN, allowNull: false },
      counts: { type: DataTypes.BOOLEAN, allowNull: false },
      checklist: { type: DataTypes.JSONB, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'MethodRevision', tableName: 'method_revision', underscored: true, timestamps: false },
  );
}
