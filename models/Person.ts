import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from "sequelize";
import { db } from "@/lib/db";

export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<string>;
  declare email: string;
  declare name: string;
  declare passwordHash: CreationOptional<string | null>;
  declare isOperator: CreationOptional<boolean>;
  declare createdAt: CreationOptional<Date>;
}

Person.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    email: { type: DataTypes.TEXT, allowNull: false },
    name: { type: DataTypes.TEXT, allowNull: false },
    passwordHash: DataTypes.TEXT,
    isOperator: DataTypes.BOOLEAN,
    createdAt: DataTypes.DATE,
  },
  { sequelize: db, modelName: "Person", tableName: "people" },
);
