import type { MailTemplate } from '@mantlet/common';

/** What each mail is told about. */
export interface MailParams {
  invitation: { name: string; invitedBy: string; link: string; days: number };
  'password-reset': { name: string; link: string; minutes: number };
  'password-changed': { name: string; link: string };
  'added-to-team': { name: string; addedBy: string; project: string; roles: string; link: string };
}
interface Words {
  subject: string;
  before: string[];
  link: { label: string; url: string };
  after: string[];
}

const words: { [T in MailTemplate]: (p: MailParams[T]) => Words } = {
  invitation: (p) => ({
    subject: 'Your account on Mantlet',
    before: [`Hello ${p.name},`, `${p.invitedBy} has made an account for you on Mantlet, where the fire protection of steel frames is worked out and issued. Choose a password to begin:`],
    link: { label: 'Choose a password', url: p.link },
    after: [`The link works once, within ${p.days} days. If it has expired, ask ${p.invitedBy} to send it again.`, 'If you did not expect this, do nothing: without a password the account stays closed.'],
  }),
  'password-reset': (p) => ({
    subject: 'Choose another password for Mantlet',
    before: [`Hello ${p.name},`, 'Somebody, probably you, asked for another password for your account on Mantlet. Choose it here:'],
    link: { label: 'Choose another password', url: p.link },
    after: [`The link works once, within ${p.minutes} minutes. Using it ends all sessions of the account.`, 'If you did not ask for it, do nothing: your password stays as it is.'],
  }),
  'password-changed': (p) => ({
    subject: 'Your password on Mantlet was changed',
    before: [`Hello ${p.name},`, 'The password of your account on Mantlet was changed just now, and the other sessions of the account were ended.', 'If that was not you, choose another password at once and tell the administrator:'],
    link: { label: 'Ask for another password', url: p.link },
    after: [],
  }),
  'added-to-team': (p) => ({
    subject: `You are on the team of ${p.project}`,
    before: [`Hello ${p.name},`, `${p.addedBy} has put you on the team of ${p.project} on Mantlet, as ${p.roles}.`],
    link: { label: 'Open the project', url: p.link },
    after: ['Results there support, and do not replace, design by licensed engineers; local codes govern.'],
  }),
};

export interface WrittenMail {
  subject: string;
  text: string;
  html: string;
}

/** As plain text and as HTML that says the same. */
export function writeMail<T extends MailTemplate>(template: T, params: MailParams[T]): WrittenMail {
  const { subject, before, link, after } = words[template](params);
  const text = [...before, link.url, ...after, 'Mantlet'].map(oneLine).join('\n\n');
  const paragraphs = [
    ...before.map(escape),
    `<a href="${escape(link.url)}" style="color:#1C2325;font-weight:600">${escape(link.label)}</a><br><span style="color:#566063;font-size:13px">${escape(link.url)}</span>`,
    ...after.map(escape),
  ];
  const body = paragraphs.map((one) => `<p style="margin:0 0 14px">${one}</p>`).join('\n');
  const html = `<!doctype html>
<html lang="en"><body style="margin:0;padding:24px;background:#F5F1E6;color:#1C2325;font:15px/1.5 Arial,sans-serif">
<div style="max-width:560px;background:#FFFDF8;border:1px solid #1C2325;padding:22px">
<p style="margin:0 0 14px;font-size:18px;font-weight:600">Mantlet</p>
${body}
</div></body></html>`;
  return { subject: oneLine(subject), text: `${text}\n`, html };
}

/** A name that somebody typed with line breaks in it must not look like a paragraph of ours. */
export const oneLine = (text: string): string => text.replace(/\s+/g, ' ').trim();
const signs: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escape = (text: string): string => oneLine(text).replace(/[&<>"']/g, (sign) => signs[sign] ?? sign);
