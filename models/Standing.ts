import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";
import type { StandingWord } from "@/lib/policies/standing";

export class Standing extends Model<InferAttributes<Standing>, InferCreationAttributes<Standing>> {
  declare id: CreationOptional<string>;
  declare certificateId: string;
  declare sequence: number;
  declare standing: StandingWord;
  declare ground: string;
  declare reason: CreationOptional<string>;
  declare setBy: string;
  declare setAt: Date;
}

Standing.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    certificateId: { type: DataTypes.UUID, allowNull: false },
    sequence: { type: DataTypes.INTEGER, allowNull: false },
    standing: { type: DataTypes.TEXT, allowNull: false },
    ground: { type: DataTypes.TEXT, allowNull: false },
    reason: DataTypes.TEXT,
    setBy: { type: DataTypes.UUID, allowNull: false },
    setAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "Standing", tableName: "standings" },
);
