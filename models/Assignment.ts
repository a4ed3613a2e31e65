import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Assignment extends Model<InferAttributes<Assignment>, InferCreationAttributes<Assignment>> {
  declare id: CreationOptional<string>;
  declare employerId: string;
  declare releaseId: string;
  declare technicianId: string;
  declare dueOn: string;
  declare exposureNote: CreationOptional<string | null>;
  declare assignedBy: string;
  declare assignedAt: CreationOptional<Date>;
}

Assignment.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    employerId: { type: DataTypes.UUID, allowNull: false },
    releaseId: { type: DataTypes.UUID, allowNull: false },
    technicianId: { type: DataTypes.UUID, allowNull: false },
    dueOn: { type: DataTypes.DATEONLY, allowNull: false },
    exposureNote: DataTypes.TEXT,
    assignedBy: { type: DataTypes.UUID, allowNull: false },
    assignedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Assignment", tableName: "assignments" },
);
