import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { CheckPlan } from "@/lib/checks/kind";
import type { Tally } from "@/lib/checks/release-check/tally";
import { db } from "@/lib/db";

/** The finished release check of one plan by one engine. */
export class ReleaseCheck extends Model<InferAttributes<ReleaseCheck>, InferCreationAttributes<ReleaseCheck>> {
  declare id: CreationOptional<string>;
  declare fingerprint: string;
  declare plan: CheckPlan;
  declare engineVersion: string;
  declare tally: Tally;
  declare finishedAt: Date;
}

ReleaseCheck.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    fingerprint: { type: DataTypes.TEXT, allowNull: false },
    plan: { type: DataTypes.JSONB, allowNull: false },
    engineVersion: { type: DataTypes.TEXT, allowNull: false },
    tally: { type: DataTypes.JSONB, allowNull: false },
    finishedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "ReleaseCheck", tableName: "release_checks" },
);
