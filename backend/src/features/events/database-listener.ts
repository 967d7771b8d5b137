import pg from 'pg';

/** a connection that says nothing for this long is tried */
const CHECK_MS = 20_000;
const FIRST_RETRY_MS = 250;
const LONGEST_RETRY_MS = 15_000;

export interface Heard {
  /** a notification of one of the channels */
  notified: (channel: string, payload: string) => void;
  /** from now on nothing is heard until the next attempt succeeds */
  lost: () => void;
}

/** One connection of its own that hears PostgreSQL's notifications, and is made again when it breaks. */
export class DatabaseListener {
  private client: pg.Client | null = null;
  private opening: Promise<boolean> | null = null;
  private timer: NodeJS.Timeout | null = null;
  private retryMs = FIRST_RETRY_MS;
  private closed = false;

  constructor(
    private readonly url: string,
    private readonly channels: readonly string[],
    private readonly heard: Heard,
  ) {}

  /** Whether it hears by now; opens the connection if there is none. */
  listening(): Promise<boolean> {
    if (this.closed) return Promise.resolve(false);
    if (this.client) return Promise.resolve(true);
    this.opening ??= this.open().finally(() => (this.opening = null));
    return this.opening;
  }

  async close(): Promise<void> {
    this.closed = true;
    if (this.timer) clearTimeout(this.timer);
    await this.opening;
    const { client } = this;
    this.client = null;
    await client?.end().catch(() => undefined);
  }

  private async open(): Promise<boolean> {
    const client = new pg.Client({ connectionString: this.url, keepAlive: true, connectionTimeoutMillis: 5000, query_timeout: 10_000, application_name: 'mantlet events' });
    client.on('error', () => undefined);
    client.on('end', () => this.lose(client));
    client.on('notification', ({ channel, payload }) => this.heard.notified(channel, payload ?? ''));
    try {
      await client.connect();
      for (const channel of this.channels) await client.query(`LISTEN ${client.escapeIdentifier(channel)}`);
    } catch {
      void client.end().catch(() => undefined);
      this.retry();
      return false;
    }
    if (this.closed) {
      await client.end().catch(() => undefined);
      return false;
    }
    this.client = client;
    this.retryMs = FIRST_RETRY_MS;
    this.after(CHECK_MS, () => this.check(client));
    return true;
  }

  /** A peer that went away without a word is only found by asking. */
  private check(client: pg.Client): void {
    client.query('SELECT 1').then(
      () => this.client === client && this.after(CHECK_MS, () => this.check(client)),
      () => { this.lose(client); void client.end().catch(() => undefined); },
    );
  }

  private lose(client: pg.Client): void {
    if (this.client !== client) return;
    this.client = null;
    this.heard.lost();
    this.retry();
  }

  private retry(): void {
    this.after(this.retryMs, () => void this.listening());
    this.retryMs = Math.min(this.retryMs * 2, LONGEST_RETRY_MS);
  }

  private after(milliseconds: number, work: () => void): void {
    if (this.timer) clearTimeout(this.timer);
    if (this.closed) return;
    this.timer = setTimeout(work, milliseconds);
    this.timer.unref();
  }
}
