import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Closing extends Model<InferAttributes<Closing>, InferCreationAttributes<Closing>> {
  declare id: CreationOptional<string>;
  declare sittingId: string;
  /** A check had no marking record, or one not met had a fresh case left. */
  declare unfinished: boolean;
  declare closedAt: Date;
}

Closing.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    sittingId: { type: DataTypes.UUID, allowNull: false },
    unfinished: { type: DataTypes.BOOLEAN, allowNull: false },
    closedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "Closing", tableName: "closings" },
);
