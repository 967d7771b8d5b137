import { setTimeout as wait } from 'node:timers/promises';
import { Inject, Injectable, Logger } from '@nestjs/common';
import type { OnModuleDestroy } from '@nestjs/common';
import type { MailFailure, MailTemplate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import type { Request } from 'express';
import { createTransport } from 'nodemailer';
import type { Transporter } from 'nodemailer';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import { isFromThisMachine } from '../../shared/this-machine.js';
import { failureOf, isWorthAnother } from './mail-failure.js';
import { MAIL_OPTIONS } from './mail-options.js';
import type { MailOptions } from './mail-options.js';
import { oneLine, writeMail } from './mail-templates.js';
import type { MailParams, WrittenMail } from './mail-templates.js';
import { Mail } from './mail.entity.js';

interface Recipient {
  /** the account, if there is one */
  id: string | null;
  name: string;
  email: string;
}

/** Sends what the product has to say, beside the answer and never before the change it tells of stands. */
@Injectable()
export class MailService implements OnModuleDestroy {
  private readonly logger = new Logger('Mail');
  private readonly transport: Transporter | null;
  private readonly underWay = new Set<Promise<void>>();
  private readonly stopping = new AbortController();

  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    @Inject(MAIL_OPTIONS) private readonly options: MailOptions,
  ) {
    const { smtpUrl } = options;
    this.transport = smtpUrl ? createTransport({ url: smtpUrl, connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 }) : null;
  }

  /** Whether mail stays on this server, and whoever asks may read it on its own page. */
  isCaughtFor(request: Request): boolean {
    return this.options.caught === 'for-everybody' || (this.options.caught === 'for-this-machine' && isFromThisMachine(request));
  }

  /** An address of this installation, as a mail gives it. */
  link(path: string): string {
    return `${this.options.publicUrl.replace(/\/+$/, '')}${path}`;
  }

  /**
   * Notes the mail in the caller's transaction. @returns what sends it, to be called once that transaction stands:
   * it returns at once, and tries again by itself where the mail server does not answer
   */
  async prepare<T extends MailTemplate>(manager: EntityManager, template: T, to: Recipient, params: MailParams[T]): Promise<() => void> {
    await manager.query(`DELETE FROM mails WHERE created_at < now() - interval '90 days'`);
    const { id } = await manager.save(manager.create(Mail, { userId: to.id, toAddress: to.email, template }));
    return () => this.inBackground(this.deliver(id, to, writeMail(template, params)));
  }

  /** Work that nobody waits for, except the server before it stops. */
  inBackground(work: Promise<void>): void {
    const settled = work.catch((error: unknown) => this.logger.error(error instanceof Error ? error.stack : String(error)));
    this.underWay.add(settled);
    void settled.finally(() => this.underWay.delete(settled));
  }

  async onModuleDestroy(): Promise<void> {
    this.stopping.abort();
    while (this.underWay.size) await Promise.all(this.underWay);
    this.transport?.close();
  }

  private async deliver(id: string, to: Recipient, mail: WrittenMail): Promise<void> {
    if (!this.transport) return this.note(id, 0, 'not-set-up');
    for (let attempt = 1; ; attempt += 1) {
      try {
        // links must not be followed by whoever carries the mail, so there is nothing to track and no file to fetch
        await this.transport.sendMail({ from: this.options.from, to: { name: oneLine(to.name), address: to.email }, ...mail, textEncoding: 'quoted-printable', disableFileAccess: true, disableUrlAccess: true });
        return await this.note(id, attempt, null);
      } catch (error) {
        await this.note(id, attempt, failureOf(error));
        const delay = this.options.retryDelaysMs[attempt - 1];
        if (delay === undefined || !isWorthAnother(error)) {
          this.logger.warn(`A mail could not be sent: ${failureOf(error)}`);
          return;
        }
        if (!(await this.waited(delay))) return this.note(id, attempt, 'stopped');
      }
    }
  }

  private waited(delay: number): Promise<boolean> {
    return wait(delay, true, { signal: this.stopping.signal }).catch(() => false);
  }

  private async note(id: string, attempts: number, failure: MailFailure | null): Promise<void> {
    // an invitation may be withdrawn meanwhile, and its note with it
    await this.dataSource.manager.update(Mail, id, { attempts, failure, sentAt: failure ? null : new Date() });
  }
}
