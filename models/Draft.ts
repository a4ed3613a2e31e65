import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Draft extends Model<InferAttributes<Draft>, InferCreationAttributes<Draft>> {
  declare moduleId: string;
  declare title: string;
  declare source: string;
  declare revision: CreationOptional<number>;
  declare savedBy: string;
  declare savedAt: CreationOptional<Date>;
}

Draft.init(
  {
    moduleId: { type: DataTypes.UUID, primaryKey: true },
    title: { type: DataTypes.TEXT, allowNull: false },
    source: { type: DataTypes.TEXT, allowNull: false },
    revision: DataTypes.INTEGER,
    savedBy: { type: DataTypes.UUID, allowNull: false },
    savedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Draft", tableName: "drafts" },
);
