import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A kept state of a claim, with its source and the mode it is taken to mean. */
export class ClaimRevision extends Model<InferAttributes<ClaimRevision>, InferCreationAttributes<ClaimRevision>> {
  declare id: CreationOptional<number>;
  declare claimId: number;
  declare n: number;
  declare kind: 'typical' | 'maximum' | 'standby' | 'networked-standby' | 'annual-energy' | 'use-energy';
  declare lower: CreationOptional<number | null>;
  declare upper: CreationOptional<number | null>;
  declare singleValue: CreationOptional<boolean>;
  declare lastDigit: CreationOptional<number | null>;
  declare tolerancePercent: CreationOptional<number | null>;
  declare unit: 'W' | 'VA' | 'kWh/a' | 'Wh/d' | 'Wh/use';
  declare usesPerYear: CreationOptional<number | null>;
  declare term: string;
  declare definition: CreationOptional<string | null>;
  declare modeId: CreationOptional<number | null>;
  declare modeReason: CreationOptional<string | null>;
  declare contradictsMode: CreationOptional<string | null>;
  declare ambientCelsius: CreationOptional<number | null>;
  declare sourceTitle: string;
  declare sourceAddress: CreationOptional<string | null>;
  declare sourcePage: CreationOptional<string | null>;
  declare readOn: string;
  declare validFrom: CreationOptional<string | null>;
  declare validUntil: CreationOptional<string | null>;
  declare authorId: CreationOptional<number | null>;
  declare createdAt: Date;
}

export function initClaimRevision(sequelize: Sequelize) {
  return ClaimRevision.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      claimId: { type: DataTypes.INTEGER, allowNull: false },
      n: { type: DataTypes.INTEGER, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      lower: { type: DataTypes.DOUBLE },
      upper: { type: DataTypes.DOUBLE },
      singleValue: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      lastDigit: { type: DataTypes.DOUBLE },
      tolerancePercent: { type: DataTypes.DOUBLE },
      unit: { type: DataTypes.TEXT, allowNull: false },
      usesPerYear: { type: DataTypes.DOUBLE },
      term: { type: DataTypes.TEXT, allowNull: false },
      definition: { type: DataTypes.TEXT },
      modeId: { type: DataTypes.INTEGER },
      modeReason: { type: DataTypes.TEXT },
      contradictsMode: { type: DataTypes.TEXT },
      ambientCelsius: { type: DataTypes.DOUBLE },
      sourceTitle: { type: DataTypes.TEXT, allowNull: false },
      sourceAddress: { type: DataTypes.TEXT },
      sourcePage: { type: DataTypes.TEXT },
      readOn: { type: DataTypes.DATEONLY, allowNull: false },
      validFrom: { type: DataTypes.DATEONLY },
      validUntil: { type: DataTypes.DATEONLY },
      authorId: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'ClaimRevision', tableName: 'claim_revision', underscored: true, timestamps: false },
  );
}
