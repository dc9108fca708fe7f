import { Sequelize } from 'sequelize';
import type { Transaction } from 'sequelize';
import { defineModels } from './models.ts';
import type { Models } from './models.ts';
import { sqliteDriver } from './sqlite-driver.ts';
import { WriteMutex } from './write-mutex.ts';

export interface Database {
  readonly sequelize: Sequelize;
  readonly models: Models;
  /**
   * Runs `work` in one IMMEDIATE transaction, alone among all writers of this process. Every write goes through
   * here. Not re-entrant: pass the transaction on instead of calling again from inside. `committed` is called once
   * the result is on disk and before the next writer begins, so that news leaves in the order of the writes.
   */
  write<T>(work: (transaction: Transaction) => Promise<T>, committed?: (result: T) => void): Promise<T>;
  /** Writes of code that makes its own statements (the session store): alone among writers, without a transaction. */
  writeAlone<T>(work: () => Promise<T>): Promise<T>;
  /** Runs several reads on one and the same state of the database, whatever is written meanwhile. */
  read<T>(work: (transaction: Transaction) => Promise<T>): Promise<T>;
  /** Waits for writes under way, then closes the connections. */
  close(): Promise<void>;
}

/** Opens the SQLite file. The tables are made by the migrations, see migrate.ts. */
export function openDatabase(file: string): Database {
  const sequelize = new Sequelize({
    dialect: 'sqlite',
    dialectModule: sqliteDriver,
    storage: file,
    logging: false,
    transactionType: 'IMMEDIATE' as Transaction.TYPES,
    define: { underscored: true, timestamps: false, freezeTableName: true },
  });
  const mutex = new WriteMutex();
  return {
    sequelize,
    models: defineModels(sequelize),
    write: (work, committed) =>
      mutex.run(async () => {
        const result = await sequelize.transaction(work);
        committed?.(result);
        return result;
      }),
    read: (work) => sequelize.transaction({ type: 'DEFERRED' as Transaction.TYPES }, work),
    writeAlone: (work) => mutex.run(work),
    async close() {
      await mutex.idle();
      await sequelize.close();
    },
  };
}
