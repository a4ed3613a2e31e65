import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Progress extends Model<InferAttributes<Progress>, InferCreationAttributes<Progress>> {
  declare subjectId: string;
  declare job: string;
  declare step: string;
  declare done: number;
  declare total: number;
  declare fault: CreationOptional<string | null>;
  declare updatedAt: CreationOptional<Date>;
}

Progress.init(
  {
    subjectId: { type: DataTypes.UUID, primaryKey: true },
    job: { type: DataTypes.TEXT, primaryKey: true },
    step: { type: DataTypes.TEXT, allowNull: false },
    done: { type: DataTypes.INTEGER, allowNull: false },
    total: { type: DataTypes.INTEGER, allowNull: false },
    fault: DataTypes.TEXT,
    updatedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Progress", tableName: "progress" },
);
