import { mkdtemp, readFile, readdir, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { readMail } from '../../src/features/caught-mail/read-mail.js';
import type { ReadMail } from '../../src/features/caught-mail/read-mail.js';
import { startSmtpFake } from '../../src/smtp-fake/smtp-fake.js';

/** The mail server of one spec, with its folder. */
export class TestMail {
  private constructor(
    readonly folder: string,
    readonly smtpUrl: string,
    private readonly closeServer: () => Promise<void>,
  ) {}

  static async start(): Promise<TestMail> {
    const folder = await mkdtemp(path.join(os.tmpdir(), 'mantlet-mail-'));
    const { url, close } = await startSmtpFake(folder);
    return new TestMail(folder, url, close);
  }

  async stop(): Promise<void> {
    await this.closeServer();
    await rm(this.folder, { recursive: true, force: true });
  }

  /** Newest last. */
  async to(address: string): Promise<ReadMail[]> {
    const names = (await readdir(this.folder)).filter((name) => /^\d.*\.eml$/.test(name)).sort();
    const mails = await Promise.all(names.map(async (name) => readMail(await readFile(path.join(this.folder, name), 'latin1'))));
    return mails.filter((mail) => mail.to.includes(address));
  }

  /** Mail leaves beside the answer: waits until so many have come. */
  async wait(address: string, count = 1): Promise<ReadMail[]> {
    for (let tries = 0; tries < 400; tries += 1) {
      const mails = await this.to(address);
      if (mails.length >= count) return mails;
      await new Promise((resume) => setTimeout(resume, 25));
    }
    throw new Error(`${count} mails to ${address} did not come`);
  }

  /** The token in the newest mail's link. */
  async token(address: string, count = 1): Promise<string> {
    const mail = (await this.wait(address, count)).at(-1);
    const token = /\/(?:accept-invitation|reset-password)#([\w-]+)/.exec(mail?.text ?? '')?.[1];
    if (!token) throw new Error(`no link in the mail to ${address}: ${mail?.text ?? ''}`);
    return token;
  }
}
