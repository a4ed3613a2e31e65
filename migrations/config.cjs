// sequelize-cli reads this file; only the owner role may change the schema.
const settings = { url: process.env.OWNER_DATABASE_URL, dialect: "postgres", logging: false, migrationStorageTableName: "schema_steps" };

module.exports = { development: settings, test: settings, production: settings };
