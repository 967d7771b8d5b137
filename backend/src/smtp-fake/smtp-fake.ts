import { randomBytes } from 'node:crypto';
import { mkdir, readdir, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';

/** newest so many are kept */
const KEPT = 200;

export interface SmtpFake {
  url: string;
  close: () => Promise<void>;
}

/** For demonstrations, development and tests: a mail server on this machine that takes every mail, passes none on, and writes each as a file. */
export async function startSmtpFake(folder: string): Promise<SmtpFake> {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    logger: false,
    size: 10_000_000,
    onData(stream, _session, done) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.once('error', done);
      stream.once('end', () => { keep(folder, Buffer.concat(parts)).then(() => done(), done); });
    },
  });
  // a connection that breaks off is its sender's trouble
  server.on('error', () => undefined);
  const listening = server.listen(0, '127.0.0.1');
  await new Promise<void>((resolve, reject) => listening.once('listening', resolve).once('error', reject));
  const { port } = listening.address() as AddressInfo;
  return { url: `smtp://127.0.0.1:${port}`, close: () => new Promise((resolve) => server.close(() => resolve())) };
}

/** Whole or not at all: a reader never meets half a mail. */
async function keep(folder: string, mail: Buffer): Promise<void> {
  const name = `${Date.now()}-${randomBytes(4).toString('hex')}.eml`;
  const made = path.join(folder, `.${name}`);
  await writeFile(made, mail, { mode: 0o600 });
  await rename(made, path.join(folder, name));
  const all = (await readdir(folder)).filter((one) => /^\d+-[0-9a-f]+\.eml$/.test(one)).sort();
  for (const old of all.slice(0, -KEPT)) await rm(path.join(folder, old), { force: true });
}
