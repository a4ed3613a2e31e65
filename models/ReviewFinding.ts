import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { ChangedRow } from "@/lib/checks/changedRows";
import type { Marking } from "@/lib/checks/kind";
import { db } from "@/lib/db";

/** What a corrected marking makes of one case, beside the record that it has. */
export class ReviewFinding extends Model<InferAttributes<ReviewFinding>, InferCreationAttributes<ReviewFinding>> {
  declare id: CreationOptional<string>;
  declare reviewId: string;
  declare caseId: string;
  declare recordId: string;
  declare metBefore: boolean;
  declare met: boolean;
  declare changedRows: ChangedRow[];
  declare marking: Marking;
  declare engineVersion: string;
  declare durationMs: number;
  declare foundAt: Date;
}

ReviewFinding.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    reviewId: { type: DataTypes.UUID, allowNull: false },
    caseId: { type: DataTypes.UUID, allowNull: false },
    recordId: { type: DataTypes.UUID, allowNull: false },
    metBefore: { type: DataTypes.BOOLEAN, allowNull: false },
    met: { type: DataTypes.BOOLEAN, allowNull: false },
    changedRows: { type: DataTypes.JSONB, allowNull: false },
    marking: { type: DataTypes.JSONB, allowNull: false },
    engineVersion: { type: DataTypes.TEXT, allowNull: false },
    durationMs: { type: DataTypes.INTEGER, allowNull: false },
    foundAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "ReviewFinding", tableName: "review_findings" },
);
