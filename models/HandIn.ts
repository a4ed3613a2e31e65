import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { Answers } from "@/lib/checks/kind";
import { db } from "@/lib/db";

export class HandIn extends Model<InferAttributes<HandIn>, InferCreationAttributes<HandIn>> {
  declare caseId: string;
  declare answers: Answers;
  declare words: CreationOptional<string>;
  declare byClock: boolean;
  declare handedInAt: Date;
}

HandIn.init(
  {
    caseId: { type: DataTypes.UUID, primaryKey: true },
    answers: { type: DataTypes.JSONB, allowNull: false },
    words: DataTypes.TEXT,
    byClock: { type: DataTypes.BOOLEAN, allowNull: false },
    handedInAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "HandIn", tableName: "hand_ins" },
);
