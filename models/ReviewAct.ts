import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export type ReviewActWord = "mark again" | "leave";

/** What the lead does about a sitting of which a corrected marking says something else. */
export class ReviewAct extends Model<InferAttributes<ReviewAct>, InferCreationAttributes<ReviewAct>> {
  declare id: CreationOptional<string>;
  declare reviewId: string;
  declare sittingId: string;
  declare act: ReviewActWord;
  declare reason: CreationOptional<string>;
  declare actedBy: string;
  declare actedAt: Date;
}

ReviewAct.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    reviewId: { type: DataTypes.UUID, allowNull: false },
    sittingId: { type: DataTypes.UUID, allowNull: false },
    act: { type: DataTypes.TEXT, allowNull: false },
    reason: DataTypes.TEXT,
    actedBy: { type: DataTypes.UUID, allowNull: false },
    actedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "ReviewAct", tableName: "review_acts" },
);
