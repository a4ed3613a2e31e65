import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Capture extends Model<InferAttributes<Capture>, InferCreationAttributes<Capture>> {
  declare id: CreationOptional<string>;
  declare caseId: string;
  declare name: string;
  declare storageKey: string;
  declare mediaType: string;
  declare sizeBytes: string;
  declare sha256: string;
  declare labels: CreationOptional<Record<string, string>>;
}

Capture.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    caseId: { type: DataTypes.UUID, allowNull: false },
    name: { type: DataTypes.TEXT, allowNull: false },
    storageKey: { type: DataTypes.TEXT, allowNull: false },
    mediaType: { type: DataTypes.TEXT, allowNull: false },
    sizeBytes: { type: DataTypes.BIGINT, allowNull: false },
    sha256: { type: DataTypes.TEXT, allowNull: false },
    labels: DataTypes.HSTORE,
  },
  { sequelize: db, modelName: "Capture", tableName: "captures" },
);
