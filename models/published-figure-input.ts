import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** What a published figure rests on, counted or not, and why. */
export class PublishedFigureInput extends Model<
  InferAttributes<PublishedFigureInput>,
  InferCreationAttributes<PublishedFigureInput>
> {
  declare id: CreationOptional<number>;
  declare publishedFigureId: number;
  declare reportFigureId: CreationOptional<number | null>;
  declare reportRevisionId: CreationOptional<number | null>;
  declare deviceId: CreationOptional<number | null>;
  declare voice: string;
  declare value: number;
  declare counted: boolean;
  declare flagged: boolean;
  declare reason: CreationOptional<string | null>;
}

export function initPublishedFigureInput(sequelize: Sequelize) {
  return PublishedFigureInput.init(
    {
      id: { type: DataTypes.INTEGER, allowNull: false, autoIncrement: true, primaryKey: true },
      publishedFigureId: { type: DataTypes.INTEGER, allowNull: false },
      reportFigureId: { type: DataTypes.INTEGER },
      reportRevisionId: { type: DataTypes.INTEGER },
      deviceId: { type: DataTypes.INTEGER },
      voice: { type: DataTypes.TEXT, allowNull: false },
      value: { type: DataTypes.DOUBLE, allowNull: false },
      counted: { type: DataTypes.BOOLEAN, allowNull: false },
      flagged: { type: DataTypes.BOOLEAN, allowNull: false },
      reason: { type: DataTypes.TEXT },
    },
    {
      sequelize,
      modelName: 'PublishedFigureInput',
      tableName: 'published_figure_input',
      underscored: true,
      timestamps: false,
    },
  );
}
