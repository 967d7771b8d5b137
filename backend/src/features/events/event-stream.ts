import { ServerResponse } from 'node:http';
import type { Role } from '@mantlet/common';

/** what may wait in a connection whose reader is slow, in bytes; beyond it the reader begins anew */
const MOST_UNREAD = 256 * 1024;

/** Whose stream it is; it ends when any of this changes. */
export interface StreamHolder {
  projectId: string;
  userId: string;
  sessionId: string;
  roles: readonly Role[];
}

/** One open page that hears of a project's changes (server-sent events). */
export class EventStream {
  constructor(
    readonly holder: StreamHolder,
    private readonly response: ServerResponse,
  ) {
    response.writeHead(200, {
      'Content-Type': 'text/event-stream; charset=utf-8', 'Cache-Control': 'no-store', Connection: 'keep-alive',
      // a proxy that collects the answer before it passes it on would make nothing live
      'X-Accel-Buffering': 'no',
    });
  }

  send(event: 'ready' | 'change' | 'closed', data: unknown): void {
    this.write(`event: ${event}\ndata: ${JSON.stringify(data)}\n\n`);
  }

  /** A comment, so that both ends and what lies between them see that the connection stands. */
  beat(): void {
    this.write(': still here\n\n');
  }

  end(): void {
    // the answer's own end() would renew the session, which a page left open must not
    Reflect.apply(ServerResponse.prototype.end, this.response, []);
  }

  private write(text: string): void {
    if (this.response.writableEnded || this.response.destroyed) return;
    if (this.response.writableLength > MOST_UNREAD) this.response.destroy();
    else this.response.write(text);
  }
}
