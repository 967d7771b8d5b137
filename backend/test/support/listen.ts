import type { AddressInfo } from 'node:net';
import type { ProjectEventDto, StreamReadyDto } from '@mantlet/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { User } from '../../src/features/users/user.entity.js';
import type { TestApp } from './app.js';

/** Waits until it holds; a fault of the test otherwise. */
export async function until<T>(what: string, look: () => T | Promise<T>, milliseconds = 15_000): Promise<Exclude<T, false | null | undefined>> {
  for (let waited = 0; waited < milliseconds; waited += 25) {
    const seen = await look();
    if (seen) return seen as Exclude<T, false | null | undefined>;
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
  throw new Error(`Waited in vain: ${what}`);
}

/** A page that listens to a project, as a browser's EventSource would. */
export class Listener {
  readonly changes: ProjectEventDto[] = [];
  ready: StreamReadyDto | null = null;
  /** the server said goodbye */
  closed = false;
  /** the connection is gone */
  ended = false;
  private readonly abort = new AbortController();

  private constructor(
    readonly status: number,
    readonly headers: Headers,
    readonly refusal: { message: string } | null,
  ) {}

  static async open(base: string, projectId: string, cookie: string): Promise<Listener> {
    const abort = new AbortController();
    const response = await fetch(`${base}/api/projects/${projectId}/events`, { headers: { accept: 'text/event-stream', cookie }, signal: abort.signal });
    const listener = new Listener(response.status, response.headers, response.ok ? null : ((await response.json()) as { message: string }));
    abort.signal.addEventListener('abort', () => undefined);
    listener.abort.signal.addEventListener('abort', () => abort.abort());
    if (response.ok && response.body) {
      void listener.read(response.body);
      await until('the stream says that it is ready', () => listener.ready);
    }
    return listener;
  }

  texts(): (string | null)[] {
    return this.changes.map((change) => change.text);
  }

  stop(): void {
    this.abort.abort();
  }

  private async read(body: ReadableStream<Uint8Array>): Promise<void> {
    let text = '';
    const decoder = new TextDecoder();
    try {
      for await (const chunk of body as unknown as AsyncIterable<Uint8Array>) {
        text += decoder.decode(chunk, { stream: true });
        const parts = text.split('\n\n');
        text = parts.pop() ?? '';
        for (const part of parts) this.take(part);
      }
    } catch {
      // stopped from here, or cut off
    }
    this.ended = true;
  }

  private take(part: string): void {
    const event = /^event: (.*)$/m.exec(part)?.[1];
    const data = /^data: (.*)$/m.exec(part)?.[1];
    if (event === 'ready') this.ready = JSON.parse(data ?? '') as StreamReadyDto;
    if (event === 'change') this.changes.push(JSON.parse(data ?? '') as ProjectEventDto);
    if (event === 'closed') this.closed = true;
  }
}

/** Where an application listens; it begins to if it does not yet. */
export async function baseOf(app: NestExpressApplication): Promise<string> {
  const server = app.getHttpServer();
  if (!server.listening) await app.listen(0, '127.0.0.1');
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
}

/** The cookie of a session of this person's. */
export async function cookieOf(app: TestApp, user: User): Promise<string> {
  const answer = await app.anonymous().post('/api/session').send({ email: user.email, password: 'a long test password' }).expect(200);
  return String(answer.headers['set-cookie']?.[0]).split(';')[0] ?? '';
}
