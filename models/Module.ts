import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Module extends Model<InferAttributes<Module>, InferCreationAttributes<Module>> {
  declare id: CreationOptional<string>;
  declare employerId: string;
  declare code: string;
  declare createdBy: string;
  declare createdAt: CreationOptional<Date>;
}

Module.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    employerId: { type: DataTypes.UUID, allowNull: false },
    code: { type: DataTypes.TEXT, allowNull: false },
    createdBy: { type: DataTypes.UUID, allowNull: false },
    createdAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Module", tableName: "modules" },
);
