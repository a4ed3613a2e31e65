import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class CaseSecret extends Model<InferAttributes<CaseSecret>, InferCreationAttributes<CaseSecret>> {
  declare caseId: string;
  declare sealed: Buffer;
  declare truthSha256: string;
  declare engineVersion: string;
}

CaseSecret.init(
  {
    caseId: { type: DataTypes.UUID, primaryKey: true },
    sealed: { type: DataTypes.BLOB, allowNull: false },
    truthSha256: { type: DataTypes.TEXT, allowNull: false },
    engineVersion: { type: DataTypes.TEXT, allowNull: false },
  },
  { sequelize: db, modelName: "CaseSecret", tableName: "case_secrets" },
);
