import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Order extends Model<InferAttributes<Order>, InferCreationAttributes<Order>> {
  declare id: CreationOptional<string>;
  declare employerId: string;
  declare amountMinor: number;
  declare currency: string;
  declare orderedBy: string;
  declare orderedAt: CreationOptional<Date>;
  declare checkoutSessionId: CreationOptional<string | null>;
  declare checkoutUrl: CreationOptional<string | null>;
  declare paidAt: CreationOptional<Date | null>;
  declare closedAt: CreationOptional<Date | null>;
}

Order.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    employerId: { type: DataTypes.UUID, allowNull: false },
    amountMinor: { type: DataTypes.INTEGER, allowNull: false },
    currency: { type: DataTypes.TEXT, allowNull: false },
    orderedBy: { type: DataTypes.UUID, allowNull: false },
    orderedAt: DataTypes.DATE,
    checkoutSessionId: DataTypes.TEXT,
    checkoutUrl: DataTypes.TEXT,
    paidAt: DataTypes.DATE,
    closedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Order", tableName: "orders" },
);
