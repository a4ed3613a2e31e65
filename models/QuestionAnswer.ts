import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class QuestionAnswer extends Model<InferAttributes<QuestionAnswer>, InferCreationAttributes<QuestionAnswer>> {
  declare id: CreationOptional<string>;
  declare questionId: string;
  declare words: string;
  declare answeredBy: string;
  declare answeredAt: CreationOptional<Date>;
}

QuestionAnswer.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    questionId: { type: DataTypes.UUID, allowNull: false },
    words: { type: DataTypes.TEXT, allowNull: false },
    answeredBy: { type: DataTypes.UUID, allowNull: false },
    answeredAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "QuestionAnswer", tableName: "question_answers" },
);
