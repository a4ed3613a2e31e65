import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { MarkedRow, Marking } from "@/lib/checks/kind";
import { db } from "@/lib/db";

export type MarkedQuantity = Marking["quantities"][number];
export type Working = Marking["workings"][number];

export class MarkingRecord extends Model<InferAttributes<MarkingRecord>, InferCreationAttributes<MarkingRecord>> {
  declare id: CreationOptional<string>;
  declare caseId: string;
  declare sequence: number;
  declare marking: string;
  declare engineVersion: string;
  declare rows: MarkedRow[];
  declare quantities: MarkedQuantity[];
  declare withinCount: number;
  declare needs: number;
  declare met: boolean;
  declare workings: Working[];
  declare durationMs: number;
  declare reason: CreationOptional<string>;
  /** The assessor, where no machine marks. */
  declare judgedBy: CreationOptional<string | null>;
  declare markedAt: CreationOptional<Date>;
}

MarkingRecord.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    caseId: { type: DataTypes.UUID, allowNull: false },
    sequence: { type: DataTypes.INTEGER, allowNull: false },
    marking: { type: DataTypes.TEXT, allowNull: false },
    engineVersion: { type: DataTypes.TEXT, allowNull: false },
    rows: { type: DataTypes.JSONB, allowNull: false },
    quantities: { type: DataTypes.JSONB, allowNull: false },
    withinCount: { type: DataTypes.INTEGER, allowNull: false },
    needs: { type: DataTypes.INTEGER, allowNull: false },
    met: { type: DataTypes.BOOLEAN, allowNull: false },
    workings: { type: DataTypes.JSONB, allowNull: false },
    durationMs: { type: DataTypes.INTEGER, allowNull: false },
    reason: DataTypes.TEXT,
    judgedBy: DataTypes.UUID,
    markedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "MarkingRecord", tableName: "marking_records" },
);
