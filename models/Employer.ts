import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Employer extends Model<InferAttributes<Employer>, InferCreationAttributes<Employer>> {
  declare id: CreationOptional<string>;
  declare slug: string;
  declare name: string;
  declare issuerStanding: CreationOptional<string>;
  declare timeZone: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
}

Employer.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    slug: { type: DataTypes.TEXT, allowNull: false },
    name: { type: DataTypes.TEXT, allowNull: false },
    issuerStanding: DataTypes.TEXT,
    timeZone: DataTypes.TEXT,
    createdAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Employer", tableName: "employers" },
);
