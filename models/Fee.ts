import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Fee extends Model<InferAttributes<Fee>, InferCreationAttributes<Fee>> {
  declare id: CreationOptional<string>;
  declare assignmentId: string;
  declare employerId: string;
  declare amountMinor: number;
  declare currency: string;
  declare dueAt: CreationOptional<Date>;
  declare orderId: CreationOptional<string | null>;
  declare settledAt: CreationOptional<Date | null>;
}

Fee.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    assignmentId: { type: DataTypes.UUID, allowNull: false },
    employerId: { type: DataTypes.UUID, allowNull: false },
    amountMinor: { type: DataTypes.INTEGER, allowNull: false },
    currency: { type: DataTypes.TEXT, allowNull: false },
    dueAt: DataTypes.DATE,
    orderId: DataTypes.UUID,
    settledAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Fee", tableName: "fees" },
);
