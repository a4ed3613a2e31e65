import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Sitting extends Model<InferAttributes<Sitting>, InferCreationAttributes<Sitting>> {
  declare id: CreationOptional<string>;
  declare number: CreationOptional<string>;
  declare assignmentId: string;
  declare releaseId: string;
  declare technicianId: string;
  declare employerId: string;
  declare terms: string;
  declare startedAt: CreationOptional<Date>;
  declare lastDay: string;
}

Sitting.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    number: DataTypes.BIGINT,
    assignmentId: { type: DataTypes.UUID, allowNull: false },
    releaseId: { type: DataTypes.UUID, allowNull: false },
    technicianId: { type: DataTypes.UUID, allowNull: false },
    employerId: { type: DataTypes.UUID, allowNull: false },
    terms: { type: DataTypes.TEXT, allowNull: false },
    startedAt: DataTypes.DATE,
    lastDay: { type: DataTypes.DATEONLY, allowNull: false },
  },
  { sequelize: db, modelName: "Sitting", tableName: "sittings" },
);
