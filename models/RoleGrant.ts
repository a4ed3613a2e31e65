import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import type { Role } from "@/lib/policies/actor";
import { db } from "@/lib/db";

export class RoleGrant extends Model<InferAttributes<RoleGrant>, InferCreationAttributes<RoleGrant>> {
  declare id: CreationOptional<string>;
  declare personId: string;
  declare employerId: string;
  declare role: Role;
  declare outsideLine: CreationOptional<boolean>;
  declare grantedBy: CreationOptional<string | null>;
  declare grantedAt: CreationOptional<Date>;
  declare endedBy: CreationOptional<string | null>;
  declare endedAt: CreationOptional<Date | null>;
}

RoleGrant.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    personId: { type: DataTypes.UUID, allowNull: false },
    employerId: { type: DataTypes.UUID, allowNull: false },
    role: { type: DataTypes.TEXT, allowNull: false },
    outsideLine: DataTypes.BOOLEAN,
    grantedBy: DataTypes.UUID,
    grantedAt: DataTypes.DATE,
    endedBy: DataTypes.UUID,
    endedAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "RoleGrant", tableName: "role_grants" },
);
