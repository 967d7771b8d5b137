import { revisionStateNames, roleNames, roles } from '@mantlet/common';
import type { OpenItemDto, ReadinessDto, RevisionDto, RevisionState, RevisionVerificationDto, Role } from '@mantlet/common';
import { count, countWord, formatDate } from '../../lib/format.js';
import { may, whyNot } from '../../lib/may.js';
import type { StatusKind } from '../../ui/status-word.js';
import type { Step } from './api/revisions.js';

export const isOpen = (state: RevisionState): boolean => state === 'draft' || state === 'prepared' || state === 'checked';
export const stateWord = (state: RevisionState): { word: string; kind: StatusKind } =>
  ({ word: revisionStateNames[state], kind: state === 'issued' ? 'settled' : state === 'superseded' ? 'neutral' : 'attention' });

/** The first figures of a digest; the whole stands in its title. */
export const shortDigest = (digest: string | null): string => (digest ? `${digest.slice(0, 12)}…` : '–');

export interface StepOffer { step: Step; text: string; /** null: may be taken; else why not */ why: string | null }

/**
 * The next step of a revision and whether this person may take it.
 * The checker is never the preparer: two people of one name are told apart by their accounts, as on the server.
 */
export function nextStep(revision: RevisionDto, held: readonly Role[], myId: string | null, readiness: ReadinessDto | undefined): StepOffer | null {
  if (!isOpen(revision.state)) return null;
  const refused = may(held, 'edit-revisions') ? null : whyNot('edit-revisions');
  if (revision.state === 'draft') {
    const blockers = readiness?.blockers.length ?? 0;
    const why = refused ?? (blockers > 0 ? `${countWord(blockers)} ${blockers === 1 ? 'item keeps' : 'items keep'} it from being prepared.` : null);
    return { step: 'prepare', text: 'Prepare', why };
  }
  if (revision.state === 'prepared') {
    const own = myId !== null && revision.prepared?.userId === myId;
    const why = refused ?? (own ? `You prepared ${revision.code} yourself. It is checked by another specifier, so that two people have looked at it.` : null);
    return { step: 'check', text: 'Sign as checked', why };
  }
  return { step: 'issue', text: 'Issue', why: refused };
}

/** The heading of the revision page: where the revision stands and what it waits for. */
export function revisionHeading(r: RevisionDto): string {
  if (r.state === 'draft') return r.returnedComment ? `${r.code} was returned and is a draft again` : `${r.code} is a draft`;
  if (r.state === 'prepared') return `${r.code} is prepared and waits for its check`;
  if (r.state === 'checked') return `${r.code} is checked and waits to be issued`;
  if (r.state === 'issued') return `${r.code} is issued${r.issued ? `, ${formatDate(r.issued.at)}` : ''}`;
  return `${r.code} is superseded; a later revision replaces it`;
}

/** What the issued revision is to those who see nothing else. */
const inForce = (held: readonly Role[]): string =>
  held.includes('contractor') ? 'Apply what this revision says; what came before it is superseded.'
    : held.includes('inspector') ? 'Inspect against this revision; what came before it is superseded.'
      : 'This is the revision in force; what came before it is superseded.';

/** The heading of the schedule page. */
export function scheduleWords(revisions: readonly RevisionDto[], readiness: ReadinessDto | undefined, held: readonly Role[] = []): { heading: string; sub: string | undefined } {
  const open = revisions.find((r) => isOpen(r.state));
  const issued = revisions.find((r) => r.state === 'issued');
  const issuedWords = issued ? `${issued.code} is issued${issued.issued ? `, ${formatDate(issued.issued.at)}` : ''}.` : 'Nothing has been issued yet.';
  if (open?.state === 'draft' && readiness) {
    const n = readiness.blockers.length;
    return { heading: n === 0 ? `${open.code} can be prepared` : `${countWord(n)} ${n === 1 ? 'item keeps' : 'items keep'} ${open.code} from being prepared`, sub: issuedWords };
  }
  if (open) return { heading: revisionHeading(open), sub: issuedWords };
  if (issued && !may(held, 'see-design')) return { heading: issuedWords.replace(/\.$/, ''), sub: inForce(held) };
  if (issued) return { heading: issuedWords.replace(/\.$/, ''), sub: 'No revision is in work. What changes from here belongs to the next one.' };
  return { heading: 'No revision yet', sub: readiness ? 'The first revision starts as a draft; preparing it freezes the schedule.' : 'Nothing has been issued yet.' };
}

export interface RoleGroup { role: Role; items: OpenItemDto[] }
/** Grouped by who must act, in the order of the roles; blockers before what is only worth a look. */
export function groupByRole({ blockers, warnings }: Pick<ReadinessDto, 'blockers' | 'warnings'>): RoleGroup[] {
  const all = [...blockers, ...warnings];
  return roles.flatMap((role) => {
    const items = all.filter((i) => i.role === role);
    return items.length > 0 ? [{ role, items }] : [];
  });
}
export const roleTally = ({ role, items }: RoleGroup): string => {
  const blockers = items.filter((i) => i.kind === 'blocker').length;
  const rest = items.length - blockers;
  return `${roleNames[role]}: ${[blockers ? `${count(blockers, 'blocker')}` : '', rest ? `${rest} worth a look` : ''].filter(Boolean).join(', ')}`;
};

/** What a verification found, in one sentence. null means that there is nothing stored to compare. */
export function verificationWords({ pdfMatches, snapshotMatches }: RevisionVerificationDto): { text: string; kind: StatusKind } {
  if (pdfMatches === false || snapshotMatches === false) {
    const what = [snapshotMatches === false ? 'the frozen schedule' : '', pdfMatches === false ? 'the PDF' : ''].filter(Boolean).join(' and ');
    return { text: `Does not match: ${what} differs from its digest. Do not use it; tell the administrator.`, kind: 'attention' };
  }
  if (snapshotMatches === null) return { text: 'Nothing is stored yet; a revision is frozen when it is prepared.', kind: 'neutral' };
  return { text: pdfMatches === null ? 'The frozen schedule matches its digest; the PDF is made on issue.' : 'The frozen schedule and the PDF both match their digests.', kind: 'settled' };
}
