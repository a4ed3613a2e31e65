import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

/** What a release relied on for one check, or for the sitting as a whole. */
export class ReleasedCheck extends Model<InferAttributes<ReleasedCheck>, InferCreationAttributes<ReleasedCheck>> {
  declare id: CreationOptional<string>;
  declare releaseId: string;
  /** Null for the sitting as a whole. */
  declare checkId: string | null;
  /** Null for the sitting, and where people judge. */
  declare releaseCheckId: string | null;
  declare within: boolean;
  declare reason: string;
}

ReleasedCheck.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    releaseId: { type: DataTypes.UUID, allowNull: false },
    checkId: DataTypes.TEXT,
    releaseCheckId: DataTypes.UUID,
    within: { type: DataTypes.BOOLEAN, allowNull: false },
    reason: { type: DataTypes.TEXT, allowNull: false },
  },
  { sequelize: db, modelName: "ReleasedCheck", tableName: "released_checks" },
);
