/** Preparing, checking and issuing the schedule. */
const and = (parts: readonly string[]): string => (parts.length < 2 ? parts.join('') : `${parts.slice(0, -1).join('; ')}; and ${parts.at(-1)}`);

export const scheduleMessages = {
  'schedule.blocked': (p: { titles: string[]; more: number }) =>
    `The schedule cannot be prepared yet: ${and([...p.titles, ...(p.more > 0 ? [`${p.more} more`] : [])])}. Settle these first.`,
  'schedule.one-open': (p: { code: string; state: string }) =>
    `Revision ${p.code} is still ${p.state}. Issue it, or go on with it, before starting another.`,
  'schedule.code-taken': (p: { code: string }) => `There already is a revision ${p.code} in this project. Choose another code.`,
  'schedule.not-draft': (p: { code: string; state: string }) =>
    `Revision ${p.code} is ${p.state} and can no longer be edited. Return it first, or start the next revision.`,
  'schedule.not-prepared': (p: { code: string; state: string }) => `Revision ${p.code} is ${p.state}; only a prepared revision can be checked.`,
  'schedule.not-checked': (p: { code: string; state: string }) => `Revision ${p.code} is ${p.state}; only a checked revision can be issued.`,
  'schedule.not-returnable': (p: { code: string; state: string }) =>
    `Revision ${p.code} is ${p.state}; only a prepared or checked revision can be returned.`,
  'schedule.own-work': (p: { code: string }) => `You prepared revision ${p.code} yourself; another specifier must check it.`,
  'schedule.issued-already': (p: { code: string; by: string; at: string }) => `Revision ${p.code} was issued by ${p.by} on ${p.at}; nothing is left to do.`,
  'schedule.snapshot-damaged': (p: { code: string }) =>
    `The stored snapshot of revision ${p.code} no longer matches its digest. Return the revision to draft and prepare it again; tell the administrator.`,
  'schedule.nothing-frozen': (p: { code: string }) => `Revision ${p.code} has no snapshot yet; prepare it first.`,
  'schedule.render-failed': (p: { code: string }) =>
    `The PDF of revision ${p.code} could not be made, and the revision was left as it was. Try again; tell the administrator if it stays.`,
};
