import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { CertificateRecord } from "@/lib/certificates/record";
import { db } from "@/lib/db";

export class Certificate extends Model<InferAttributes<Certificate>, InferCreationAttributes<Certificate>> {
  declare id: CreationOptional<string>;
  declare number: string;
  declare decisionId: string;
  declare sittingId: string;
  declare employerId: string;
  declare holderId: string;
  declare record: CertificateRecord;
  declare recordText: string;
  declare fingerprint: string;
  declare effectiveOn: string;
  declare lastDay: string;
  declare pdf: Buffer;
  declare pdfSha256: string;
  declare issuedAt: Date;
}

Certificate.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    number: { type: DataTypes.TEXT, allowNull: false },
    decisionId: { type: DataTypes.UUID, allowNull: false },
    sittingId: { type: DataTypes.UUID, allowNull: false },
    employerId: { type: DataTypes.UUID, allowNull: false },
    holderId: { type: DataTypes.UUID, allowNull: false },
    record: { type: DataTypes.JSONB, allowNull: false },
    recordText: { type: DataTypes.TEXT, allowNull: false },
    fingerprint: { type: DataTypes.TEXT, allowNull: false },
    effectiveOn: { type: DataTypes.DATEONLY, allowNull: false },
    lastDay: { type: DataTypes.DATEONLY, allowNull: false },
    pdf: { type: DataTypes.BLOB, allowNull: false },
    pdfSha256: { type: DataTypes.TEXT, allowNull: false },
    issuedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "Certificate", tableName: "certificates" },
);
