/** Brings the database in the data folder to the newest form and stops: the program behind `npm run migrate`. */
import { mkdir } from 'node:fs/promises';
import { parseEnvironment } from '#server/config/environment.ts';
import { createLogger } from '#server/config/logger.ts';
import { databaseFile } from './database-file.ts';
import { openDatabase } from './database.ts';
import { createMigrator } from './migrator.ts';

const environment = parseEnvironment(process.env);
const logger = createLogger(environment.logLevel);
await mkdir(environment.dataFolder, { recursive: true });
const database = openDatabase(databaseFile(environment.dataFolder));
const done = await createMigrator(database).up();
logger.info({ steps: done.map(({ name }) => name) }, 'the database has its newest form');
await database.close();
