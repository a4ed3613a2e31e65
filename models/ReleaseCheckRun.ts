import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { CheckPlan } from "@/lib/checks/kind";
import type { Tally } from "@/lib/checks/release-check/tally";
import { db } from "@/lib/db";

/** A release check under way, or a finished look at fewer cases. */
export class ReleaseCheckRun extends Model<InferAttributes<ReleaseCheckRun>, InferCreationAttributes<ReleaseCheckRun>> {
  declare id: CreationOptional<string>;
  declare fingerprint: string;
  declare preview: boolean;
  declare plan: CheckPlan;
  declare employerId: string;
  declare askedBy: string;
  declare askedAt: Date;
  declare stoppedAt: CreationOptional<Date | null>;
  declare tried: CreationOptional<number>;
  declare wholeTried: CreationOptional<number>;
  declare tally: CreationOptional<Tally | null>;
  declare finishedAt: CreationOptional<Date | null>;
}

ReleaseCheckRun.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    fingerprint: { type: DataTypes.TEXT, allowNull: false },
    preview: { type: DataTypes.BOOLEAN, allowNull: false },
    plan: { type: DataTypes.JSONB, allowNull: false },
    employerId: { type: DataTypes.UUID, allowNull: false },
    askedBy: { type: DataTypes.UUID, allowNull: false },
    askedAt: { type: DataTypes.DATE, allowNull: false },
    stoppedAt: DataTypes.DATE,
    tried: DataTypes.INTEGER,
    wholeTried: DataTypes.INTEGER,
    tally: DataTypes.JSONB,
    finishedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "ReleaseCheckRun", tableName: "release_check_runs" },
);
