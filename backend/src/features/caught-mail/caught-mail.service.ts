import { readFile, readdir } from 'node:fs/promises';
import path from 'node:path';
import { Inject, Injectable } from '@nestjs/common';
import type { CaughtMailDto, CaughtMailTextDto } from '@mantlet/common';
import { caughtMailIdSchema } from '@mantlet/common';
import { notFound } from '../../shared/refusal.js';
import { readMail } from './read-mail.js';

export const CAUGHT_MAIL_DIR = Symbol('folder of caught mail');

/** Reads what the mail server of a demonstration caught. */
@Injectable()
export class CaughtMailService {
  constructor(@Inject(CAUGHT_MAIL_DIR) private readonly folder: string) {}

  /** Newest first. */
  async list(): Promise<CaughtMailDto[]> {
    const names = await readdir(this.folder).catch(() => []);
    const ids = names.filter((name) => name.endsWith('.eml')).map((name) => name.slice(0, -4)).filter((id) => caughtMailIdSchema.safeParse(id).success);
    const read = await Promise.all(ids.sort().reverse().map((id) => this.read(id).catch(() => null)));
    return read.filter((one) => one !== null).map(({ id, at, to, subject }) => ({ id, at, to, subject }));
  }

  async find(id: string): Promise<CaughtMailTextDto> {
    return this.read(id).catch(() => { throw notFound('mail'); });
  }

  private async read(id: string): Promise<CaughtMailTextDto> {
    const mail = readMail(await readFile(path.join(this.folder, `${id}.eml`), 'latin1'));
    return { id, at: new Date(Number(id.slice(0, 13))).toISOString(), ...mail };
  }
}
