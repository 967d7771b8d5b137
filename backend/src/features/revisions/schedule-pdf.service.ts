import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { HttpStatus, Injectable, Logger } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { ScheduleSnapshot } from '@mantlet/common';
import { Refusal } from '../../shared/refusal.js';
import { renderSchedulePdf } from './schedule-pdf/render.js';
import type { PdfSignatures, SchedulePdfInput } from './schedule-pdf/types.js';

const workerFile = new URL('../../worker/schedule-pdf.worker.js', import.meta.url);
/** longer than any schedule takes; a worker that hangs is ended */
const LIMIT_MS = 300_000;

export type WorkerAnswer = { pdf: Uint8Array } | { error: string };

/** Renders PDFs in a worker thread, one at a time: thousands of rows take seconds in which the server must go on answering. */
@Injectable()
export class SchedulePdfService {
  private readonly logger = new Logger('SchedulePdf');
  private last: Promise<unknown> = Promise.resolve();

  async render(snapshot: ScheduleSnapshot, snapshotSha256: string | null, signatures: PdfSignatures): Promise<Buffer> {
    const input: SchedulePdfInput = { snapshot, snapshotSha256, signatures };
    const turn = this.last.then(() => this.run(input));
    this.last = turn.catch(() => undefined);
    try {
      return await turn;
    } catch (error) {
      this.logger.error(error instanceof Error ? error.stack : String(error));
      throw new Refusal(HttpStatus.INTERNAL_SERVER_ERROR, message('schedule.render-failed', { code: snapshot.revision.code }));
    }
  }

  private run(input: SchedulePdfInput): Promise<Buffer> {
    // the worker's file exists once compiled; where the sources are run as they are, as in the specs, the same function is called here
    return existsSync(fileURLToPath(workerFile)) ? this.inWorker(input) : renderSchedulePdf(input);
  }

  private inWorker(input: SchedulePdfInput): Promise<Buffer> {
    return new Promise((resolve, reject) => {
      const worker = new Worker(workerFile, { workerData: input });
      const timer = setTimeout(() => finish(() => reject(new Error(`the PDF was not ready after ${LIMIT_MS / 1000} s`))), LIMIT_MS);
      const finish = (settle: () => void): void => {
        clearTimeout(timer);
        settle();
        void worker.terminate();
      };
      worker.once('message', (answer: WorkerAnswer) => finish(() => ('pdf' in answer ? resolve(Buffer.from(answer.pdf)) : reject(new Error(answer.error)))));
      worker.once('error', (error) => finish(() => reject(error)));
      worker.once('exit', (code) => finish(() => reject(new Error(`the PDF worker ended with ${code} before it was done`))));
    });
  }
}
