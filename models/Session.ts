import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: CreationOptional<string>;
  declare personId: string;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare passwordAt: CreationOptional<Date | null>;
  declare endedAt: CreationOptional<Date | null>;
}

Session.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    personId: { type: DataTypes.UUID, allowNull: false },
    createdAt: DataTypes.DATE,
    expiresAt: { type: DataTypes.DATE, allowNull: false },
    passwordAt: DataTypes.DATE,
    endedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Session", tableName: "sessions" },
);
