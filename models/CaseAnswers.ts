import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { Answers } from "@/lib/checks/kind";
import { db } from "@/lib/db";

export class CaseAnswers extends Model<InferAttributes<CaseAnswers>, InferCreationAttributes<CaseAnswers>> {
  declare caseId: string;
  declare answers: Answers;
  declare revision: number;
  declare savedAt: Date;
}

CaseAnswers.init(
  {
    caseId: { type: DataTypes.UUID, primaryKey: true },
    answers: { type: DataTypes.JSONB, allowNull: false },
    revision: { type: DataTypes.INTEGER, allowNull: false },
    savedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "CaseAnswers", tableName: "case_answers" },
);
