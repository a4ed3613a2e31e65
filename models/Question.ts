import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Question extends Model<InferAttributes<Question>, InferCreationAttributes<Question>> {
  declare id: CreationOptional<string>;
  declare markingRecordId: string;
  declare quantity: string;
  declare words: string;
  declare askedBy: string;
  declare askedAt: CreationOptional<Date>;
}

Question.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    markingRecordId: { type: DataTypes.UUID, allowNull: false },
    quantity: { type: DataTypes.TEXT, allowNull: false },
    words: { type: DataTypes.TEXT, allowNull: false },
    askedBy: { type: DataTypes.UUID, allowNull: false },
    askedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Question", tableName: "questions" },
);
