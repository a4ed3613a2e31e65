import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Training extends Model<InferAttributes<Training>, InferCreationAttributes<Training>> {
  declare id: CreationOptional<string>;
  declare employerId: string;
  declare trainerId: string;
  declare technicianId: string;
  declare endedOn: string;
  declare recordedBy: string;
  declare recordedAt: CreationOptional<Date>;
}

Training.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    employerId: { type: DataTypes.UUID, allowNull: false },
    trainerId: { type: DataTypes.UUID, allowNull: false },
    technicianId: { type: DataTypes.UUID, allowNull: false },
    endedOn: { type: DataTypes.DATEONLY, allowNull: false },
    recordedBy: { type: DataTypes.UUID, allowNull: false },
    recordedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Training", tableName: "trainings" },
);
