import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export type Outcome = "competent" | "not yet competent";
/** What lay before the decider: each marking record with the hash of its row. */
export type Evidence = { checkId: string; caseId: string; markingRecordId: string; met: boolean; sha256: string }[];

export class Decision extends Model<InferAttributes<Decision>, InferCreationAttributes<Decision>> {
  declare id: CreationOptional<string>;
  declare sittingId: string;
  declare outcome: Outcome;
  declare reason: string;
  declare declaration: string;
  declare outsideLine: boolean;
  declare evidence: Evidence;
  declare evidenceSha256: string;
  declare signedAfreshAt: Date;
  declare decidedBy: string;
  declare decidedAt: Date;
}

Decision.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    sittingId: { type: DataTypes.UUID, allowNull: false },
    outcome: { type: DataTypes.TEXT, allowNull: false },
    reason: { type: DataTypes.TEXT, allowNull: false },
    declaration: { type: DataTypes.TEXT, allowNull: false },
    outsideLine: { type: DataTypes.BOOLEAN, allowNull: false },
    evidence: { type: DataTypes.JSONB, allowNull: false },
    evidenceSha256: { type: DataTypes.TEXT, allowNull: false },
    signedAfreshAt: { type: DataTypes.DATE, allowNull: false },
    decidedBy: { type: DataTypes.UUID, allowNull: false },
    decidedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "Decision", tableName: "decisions" },
);
