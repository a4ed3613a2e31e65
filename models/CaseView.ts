import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { PublicCase } from "@/lib/checks/kind";
import { db } from "@/lib/db";

/** A file of the case, as the technician is told of it. */
export type CaseFileView = { name: string; mediaType: string; sizeBytes: number; sha256: string };

export class CaseView extends Model<InferAttributes<CaseView>, InferCreationAttributes<CaseView>> {
  declare caseId: string;
  declare view: PublicCase;
  declare files: CaseFileView[];
  declare draws: number;
  declare openedAt: Date;
  declare endsAt: Date;
}

CaseView.init(
  {
    caseId: { type: DataTypes.UUID, primaryKey: true },
    view: { type: DataTypes.JSONB, allowNull: false },
    files: { type: DataTypes.JSONB, allowNull: false },
    draws: { type: DataTypes.INTEGER, allowNull: false },
    openedAt: { type: DataTypes.DATE, allowNull: false },
    endsAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "CaseView", tableName: "case_views" },
);
