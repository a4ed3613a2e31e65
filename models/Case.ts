import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Case extends Model<InferAttributes<Case>, InferCreationAttributes<Case>> {
  declare id: CreationOptional<string>;
  declare sittingId: string;
  declare checkId: string;
  declare kind: string;
  declare kindVersion: number;
  declare number: number;
  declare requestedAt: CreationOptional<Date>;
}

Case.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    sittingId: { type: DataTypes.UUID, allowNull: false },
    checkId: { type: DataTypes.TEXT, allowNull: false },
    kind: { type: DataTypes.TEXT, allowNull: false },
    kindVersion: { type: DataTypes.INTEGER, allowNull: false },
    number: { type: DataTypes.INTEGER, allowNull: false },
    requestedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Case", tableName: "cases" },
);
