import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Mail extends Model<InferAttributes<Mail>, InferCreationAttributes<Mail>> {
  declare id: CreationOptional<string>;
  declare toEmail: string;
  declare subject: string;
  declare body: string;
  declare certificateId: CreationOptional<string | null>;
  declare writtenAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
}

Mail.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    toEmail: { type: DataTypes.TEXT, allowNull: false },
    subject: { type: DataTypes.TEXT, allowNull: false },
    body: { type: DataTypes.TEXT, allowNull: false },
    certificateId: DataTypes.UUID,
    writtenAt: DataTypes.DATE,
    sentAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Mail", tableName: "mails" },
);
