import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

/** A corrected marking is held against an employer's records of older ones. */
export class MarkingReview extends Model<InferAttributes<MarkingReview>, InferCreationAttributes<MarkingReview>> {
  declare id: CreationOptional<string>;
  declare employerId: string;
  declare kind: string;
  declare kindVersion: number;
  declare marking: string;
  declare reason: string;
  declare cases: number;
  declare askedBy: string;
  declare askedAt: Date;
}

MarkingReview.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    employerId: { type: DataTypes.UUID, allowNull: false },
    kind: { type: DataTypes.TEXT, allowNull: false },
    kindVersion: { type: DataTypes.INTEGER, allowNull: false },
    marking: { type: DataTypes.TEXT, allowNull: false },
    reason: { type: DataTypes.TEXT, allowNull: false },
    cases: { type: DataTypes.INTEGER, allowNull: false },
    askedBy: { type: DataTypes.UUID, allowNull: false },
    askedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "MarkingReview", tableName: "marking_reviews" },
);
