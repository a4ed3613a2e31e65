import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export type JobActWord = "try again" | "leave";

/** What the operator did about a stopped job; `jobId` is the queue's, whose row goes after some weeks. */
export class JobAct extends Model<InferAttributes<JobAct>, InferCreationAttributes<JobAct>> {
  declare id: CreationOptional<string>;
  declare jobId: string;
  declare job: string;
  declare act: JobActWord;
  declare reason: CreationOptional<string>;
  declare actedBy: string;
  declare actedAt: Date;
}

JobAct.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    jobId: { type: DataTypes.UUID, allowNull: false },
    job: { type: DataTypes.TEXT, allowNull: false },
    act: { type: DataTypes.TEXT, allowNull: false },
    reason: DataTypes.TEXT,
    actedBy: { type: DataTypes.UUID, allowNull: false },
    actedAt: { type: DataTypes.DATE, allowNull: false },
  },
  { sequelize: db, modelName: "JobAct", tableName: "job_acts" },
);
