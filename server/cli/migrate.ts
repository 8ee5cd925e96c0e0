import { migrateDatabase } from '../db/migrate.ts';

const databaseUrl = process.env.DATABASE_URL;
if (databaseUrl === undefined) throw new Error('DATABASE_URL names no database to migrate');
await migrateDatabase(databaseUrl);
