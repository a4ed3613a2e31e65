import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { CheckPlan } from "@/lib/checks/kind";
import { db } from "@/lib/db";

export type ReleaseKind = "first" | "editorial" | "minor" | "major";

export class Release extends Model<InferAttributes<Release>, InferCreationAttributes<Release>> {
  declare id: CreationOptional<string>;
  declare moduleId: string;
  declare employerId: string;
  declare number: string;
  declare kind: ReleaseKind;
  declare title: string;
  declare source: string;
  declare tree: ModuleTree;
  declare frontMatter: FrontMatter;
  declare checks: CheckPlan[];
  declare fingerprint: string;
  declare reason: string;
  declare releasedBy: string;
  declare releasedAt: CreationOptional<Date>;
}

Release.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    moduleId: { type: DataTypes.UUID, allowNull: false },
    employerId: { type: DataTypes.UUID, allowNull: false },
    number: { type: DataTypes.TEXT, allowNull: false },
    kind: { type: DataTypes.TEXT, allowNull: false },
    title: { type: DataTypes.TEXT, allowNull: false },
    source: { type: DataTypes.TEXT, allowNull: false },
    tree: { type: DataTypes.JSONB, allowNull: false },
    frontMatter: { type: DataTypes.JSONB, allowNull: false },
    checks: { type: DataTypes.JSONB, allowNull: false },
    fingerprint: { type: DataTypes.TEXT, allowNull: false },
    reason: { type: DataTypes.TEXT, allowNull: false },
    releasedBy: { type: DataTypes.UUID, allowNull: false },
    releasedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Release", tableName: "releases" },
);
