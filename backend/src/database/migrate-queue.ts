import { runMigrations } from 'graphile-worker';

/** The queue's own tables, in a schema of their own; jobs are put into it inside the transactions of the application. */
export async function migrateQueue(url: string): Promise<void> {
  await runMigrations({ connectionString: url });
}
