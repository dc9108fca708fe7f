import path from 'node:path';

/** The SQLite file inside the data folder. */
export function databaseFile(dataFolder: string): string {
  return path.join(dataFolder, 'holdwater.sqlite');
}
