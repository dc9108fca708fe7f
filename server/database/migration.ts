/** One step of the database's form, and its way back. `run` executes one statement inside the step's transaction. */
export interface Migration {
  /** Begins with its place in the order: '0001-people'. Never renamed once released. */
  readonly name: string;
  up(run: RunStatement): Promise<void>;
  down(run: RunStatement): Promise<void>;
}

export type RunStatement = (statement: string) => Promise<unknown>;
