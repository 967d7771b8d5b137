import { Logger } from '@nestjs/common';
import pg from 'pg';
import { HOLD_LOCK } from '../features/jobs/worker-locks.js';

const RETRY_MS = 1000;

/** Holds the locks by which others see that this process's workers live; takes them again when the connection broke. */
export class WorkerPresence {
  private readonly names = new Set<string>();
  private readonly logger = new Logger('Worker');
  private client: pg.Client | null = null;
  private closed = false;

  constructor(private readonly url: string) {}

  async open(): Promise<void> {
    const client = new pg.Client({ connectionString: this.url, keepAlive: true, application_name: 'mantlet worker' });
    client.on('error', () => undefined);
    client.on('end', () => this.again(client));
    await client.connect();
    this.client = client;
    for (const name of this.names) await client.query(HOLD_LOCK, [name]);
  }

  async add(name: string): Promise<void> {
    this.names.add(name);
    await this.client?.query(HOLD_LOCK, [name]);
  }

  async close(): Promise<void> {
    this.closed = true;
    await this.client?.end().catch(() => undefined);
  }

  private again(client: pg.Client): void {
    if (this.closed || this.client !== client) return;
    this.client = null;
    const attempt = (): void => {
      if (this.closed) return;
      this.open().catch((error: unknown) => {
        this.logger.warn(`The database cannot be reached: ${String(error)}`);
        setTimeout(attempt, RETRY_MS).unref();
      });
    };
    setTimeout(attempt, RETRY_MS).unref();
  }
}
