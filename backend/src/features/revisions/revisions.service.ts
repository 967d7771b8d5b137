import { isDeepStrictEqual } from 'node:util';
import { Injectable } from '@nestjs/common';
import { message, revisionStateNames } from '@mantlet/common';
import type {
  OpenItemDto, ReadinessDto, ReturnInput, RevisionDetailDto, RevisionDto, RevisionInput, RevisionUpdate, RevisionState, RevisionVerificationDto, ScheduleSnapshot,
} from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In } from 'typeorm';
import type { EntityManager, FindOptionsWhere } from 'typeorm';
import { isDesigner } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { canonicalJson, sha256 } from '../../shared/canonical-json.js';
import { lockProject } from '../../shared/project-lock.js';
import { conflict, notFound, unprocessable } from '../../shared/refusal.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { OpenItemsService } from '../assessment/open-items.service.js';
import { AuditService, changesBetween } from '../audit/audit.service.js';
import type { Recorded } from '../audit/audit.service.js';
import { Revision } from './revision.entity.js';
import { SchedulePdfService } from './schedule-pdf.service.js';
import type { PdfSignatures } from './schedule-pdf/types.js';
import { SnapshotService, protectedArea, summaryOf } from './snapshot.service.js';

const signers = { preparedBy: true, checkedBy: true, issuedBy: true } as const;
const openStates: RevisionState[] = ['draft', 'prepared', 'checked'];
const issuedStates: RevisionState[] = ['issued', 'superseded'];
const inWords = (state: RevisionState): string => revisionStateNames[state].toLowerCase();
/** titles said in the sentence of a refusal; the rest is in its issues */
const SAID_BLOCKERS = 3;

/** The life of a schedule: draft, prepared, checked by another, issued, superseded. */
@Injectable()
export class RevisionsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly assessment: AssessmentService,
    private readonly items: OpenItemsService,
    private readonly snapshots: SnapshotService,
    private readonly pdfs: SchedulePdfService,
    private readonly audit: AuditService,
  ) {}

  async readiness(projectId: string): Promise<ReadinessDto> {
    const items = await this.items.openItems(projectId);
    const blockers = items.filter((item) => item.kind === 'blocker');
    return {
      ready: blockers.length === 0, current: !blockers.some((item) => ['stale', 'recalculating'].includes(item.code)), blockers, warnings: items.filter((item) => item.kind === 'warning'),
    };
  }

  /** Newest first; whoever holds no design role sees what is issued or was. */
  async list(scope: ProjectScope): Promise<RevisionDto[]> {
    const found = await this.dataSource.manager.find(Revision, { where: visibleTo(scope), relations: signers, order: { createdAt: 'DESC', code: 'DESC' } });
    return found.map(toRevisionDto);
  }

  async detail(scope: ProjectScope, id: string): Promise<RevisionDetailDto> {
    const revision = await this.find(scope, id);
    const snapshot = await this.snapshotText(this.dataSource.manager, id);
    return { ...toRevisionDto(revision), summary: snapshot === null ? null : summaryOf(JSON.parse(snapshot) as ScheduleSnapshot) };
  }

  /** One revision is in work at a time. */
  async create(scope: ProjectScope, input: RevisionInput): Promise<RevisionDto> {
    const { projectId } = scope;
    return this.dataSource.transaction(async (manager) => {
      await lockProject(manager, projectId);
      const open = await manager.findOneBy(Revision, { projectId, state: In(openStates) });
      if (open) throw conflict(message('schedule.one-open', { code: open.code, state: inWords(open.state) }));
      await this.requireFreeCode(manager, projectId, input.code);
      const { id } = await manager.save(manager.create(Revision, { projectId, ...input }));
      await this.record(manager, scope, id, input.code, 'revision started', { changes: [{ field: 'purpose', old: null, new: input.purpose }] });
      return this.dto(manager, id);
    });
  }

  async update(scope: ProjectScope, id: string, { was, ...input }: RevisionUpdate): Promise<RevisionDto> {
    return this.inState(scope, id, async (manager, revision) => {
      requireDraft(revision);
      const standing = { code: revision.code, purpose: revision.purpose };
      if (was) await this.audit.requireUnchanged(manager, { projectId: scope.projectId, entity: 'revision', entityId: id, what: 'revision' }, standing, was);
      if (input.code !== revision.code) await this.requireFreeCode(manager, scope.projectId, input.code);
      await manager.update(Revision, id, { code: input.code, purpose: input.purpose });
      await this.record(manager, scope, id, input.code, 'revision changed', { changes: changesBetween<RevisionInput>(revision, input, ['code', 'purpose']) });
    });
  }

  /** Freezes the schedule, if nothing stands in the way. What changes afterwards belongs to the next revision. */
  async prepare(scope: ProjectScope, id: string): Promise<RevisionDto> {
    return this.inState(scope, id, async (manager, revision) => {
      requireDraft(revision);
      const at = new Date();
      const snapshot = await this.snapshots.take(manager, revision, at);
      if (snapshot.blockers.length > 0) throw blocked(snapshot.blockers);
      const text = canonicalJson(snapshot);
      const changes = {
        state: 'prepared' as const, preparedById: scope.actor.id, preparedAt: at, returnedComment: null, snapshot: text, snapshotSha256: sha256(text),
        members: snapshot.members.length, protectedAreaM2: protectedArea(snapshot),
      };
      await manager.update(Revision, id, changes);
      await this.record(manager, scope, id, revision.code, 'revision prepared', { changes: [{ field: 'snapshotSha256', old: null, new: changes.snapshotSha256 }] });
    });
  }

  /** By another specifier than the one who prepared it. */
  async check(scope: ProjectScope, id: string): Promise<RevisionDto> {
    return this.inState(scope, id, async (manager, revision) => {
      if (revision.state !== 'prepared') throw conflict(message('schedule.not-prepared', { code: revision.code, state: inWords(revision.state) }));
      if (revision.preparedById === scope.actor.id) throw conflict(message('schedule.own-work', { code: revision.code }));
      await this.intactSnapshot(manager, revision);
      await manager.update(Revision, id, { state: 'checked', checkedById: scope.actor.id, checkedAt: new Date() });
      await this.record(manager, scope, id, revision.code, 'revision checked');
    });
  }

  /** Back to draft, with what must change; the snapshot goes, the audit trail keeps who had prepared and checked it. */
  async giveBack(scope: ProjectScope, id: string, { comment }: ReturnInput): Promise<RevisionDto> {
    return this.inState(scope, id, async (manager, revision) => {
      if (revision.state !== 'prepared' && revision.state !== 'checked') {
        throw conflict(message('schedule.not-returnable', { code: revision.code, state: inWords(revision.state) }));
      }
      await manager.update(Revision, id, {
        state: 'draft', preparedById: null, preparedAt: null, checkedById: null, checkedAt: null, returnedComment: comment,
        snapshot: null, snapshotSha256: null, members: null, protectedAreaM2: null,
      });
      await this.record(manager, scope, id, revision.code, 'revision returned', { why: comment, changes: [{ field: 'state', old: revision.state, new: 'draft' }] });
    });
  }

  /**
   * Renders the PDF from the snapshot and supersedes the revision issued before: all or nothing. Rendering takes seconds, in which
   * nobody is kept from working; what was rendered is stored only if it is still what was checked. The second of two is told.
   */
  async issue(scope: ProjectScope, id: string): Promise<RevisionDto> {
    const rendered = await this.find(scope, id);
    requireChecked(rendered);
    const snapshot = await this.intactSnapshot(this.dataSource.manager, rendered);
    const issuedAt = new Date();
    const signatures = { ...signaturesOf(rendered), state: 'issued' as const, issued: signature(scope.actor, issuedAt) };
    const pdf = await this.pdfs.render(snapshot, rendered.snapshotSha256, signatures);
    return this.inState(scope, id, async (manager, revision) => {
      requireChecked(revision);
      // returned, prepared and checked anew meanwhile: another schedule, or other signatures under it
      const before = [rendered.snapshotSha256, signaturesOf(rendered)];
      if (!isDeepStrictEqual(before, [revision.snapshotSha256, signaturesOf(revision)])) throw conflict(message('shared.stale', { what: 'revision' }));
      await manager.update(Revision, { projectId: scope.projectId, state: 'issued' }, { state: 'superseded' });
      await manager.update(Revision, id, {
        state: 'issued', issuedById: scope.actor.id, issuedAt, pdf, pdfSha256: sha256(pdf), pdfBytes: pdf.length,
      });
      await this.record(manager, scope, id, revision.code, 'revision issued', { changes: [{ field: 'pdfSha256', old: null, new: sha256(pdf) }] });
    });
  }

  /** The stored PDF of an issued revision; for the design team, of one in work, a preview marked as such and stored nowhere. */
  async pdf(scope: ProjectScope, id: string): Promise<{ content: Buffer; fileName: string; sha256: string }> {
    const { manager } = this.dataSource;
    const revision = await this.find(scope, id);
    const fileName = await this.fileName(manager, revision);
    if (issuedStates.includes(revision.state)) {
      const [row] = await manager.query<{ pdf: Buffer }[]>('SELECT pdf FROM revisions WHERE id = $1', [id]);
      if (!row) throw notFound('revision');
      return { content: row.pdf, fileName, sha256: sha256(row.pdf) };
    }
    const snapshot = revision.state === 'draft' ? await this.snapshots.take(manager, revision, new Date()) : await this.intactSnapshot(manager, revision);
    const content = await this.pdfs.render(snapshot, revision.snapshotSha256, signaturesOf(revision));
    return { content, fileName: fileName.replace(/\.pdf$/, `-${revision.state}.pdf`), sha256: sha256(content) };
  }

  /** Whether what is stored still has the digests it was stored with; null for what is not there yet. */
  async verify(scope: ProjectScope, id: string): Promise<RevisionVerificationDto> {
    const revision = await this.find(scope, id);
    const [row] = await this.dataSource.manager.query<{ pdf: Buffer | null; snapshot: string | null }[]>('SELECT pdf, snapshot FROM revisions WHERE id = $1', [id]);
    return {
      pdfMatches: row?.pdf ? sha256(row.pdf) === revision.pdfSha256 : null,
      snapshotMatches: row?.snapshot ? sha256(row.snapshot) === revision.snapshotSha256 : null,
    };
  }

  /** The issued revision and its snapshot, or null where nothing is issued. */
  async issued(projectId: string): Promise<{ revision: Revision; snapshot: ScheduleSnapshot } | null> {
    const { manager } = this.dataSource;
    const revision = await manager.findOneBy(Revision, { projectId, state: 'issued' });
    return revision && { revision, snapshot: await this.intactSnapshot(manager, revision) };
  }

  /** Runs a step of the revision's life with the project and the revision held, so that two people cannot take it at once. */
  private async inState(scope: ProjectScope, id: string, step: (manager: EntityManager, revision: Revision) => Promise<void>): Promise<RevisionDto> {
    return this.dataSource.transaction(async (manager) => {
      await lockProject(manager, scope.projectId);
      const revision = await manager.findOne(Revision, { where: { id, projectId: scope.projectId }, relations: signers });
      if (!revision) throw notFound('revision');
      await step(manager, revision);
      return this.dto(manager, id);
    });
  }

  private async find(scope: ProjectScope, id: string): Promise<Revision> {
    const revision = await this.dataSource.manager.findOne(Revision, { where: { ...visibleTo(scope), id }, relations: signers });
    if (!revision) throw notFound('revision');
    return revision;
  }

  private async dto(manager: EntityManager, id: string): Promise<RevisionDto> {
    return toRevisionDto(await manager.findOneOrFail(Revision, { where: { id }, relations: signers }));
  }

  private async requireFreeCode(manager: EntityManager, projectId: string, code: string): Promise<void> {
    if (await manager.existsBy(Revision, { projectId, code })) throw conflict(message('schedule.code-taken', { code }));
  }

  private async snapshotText(manager: EntityManager, id: string): Promise<string | null> {
    const [row] = await manager.query<{ snapshot: string | null }[]>('SELECT snapshot FROM revisions WHERE id = $1', [id]);
    return row?.snapshot ?? null;
  }

  private async intactSnapshot(manager: EntityManager, revision: Revision): Promise<ScheduleSnapshot> {
    const text = await this.snapshotText(manager, revision.id);
    if (text === null) throw conflict(message('schedule.nothing-frozen', { code: revision.code }));
    if (sha256(text) !== revision.snapshotSha256) throw conflict(message('schedule.snapshot-damaged', { code: revision.code }));
    return JSON.parse(text) as ScheduleSnapshot;
  }

  private async fileName(manager: EntityManager, revision: Revision): Promise<string> {
    const [project] = await manager.query<{ number: string }[]>('SELECT number FROM projects WHERE id = $1', [revision.projectId]);
    const safe = (text: string): string => text.replace(/[^A-Za-z0-9._-]+/g, '-').replace(/^-+|-+$/g, '');
    return `${safe(project?.number ?? '') || 'project'}-protection-schedule-${safe(revision.code) || 'revision'}.pdf`;
  }

  private record(manager: EntityManager, scope: ProjectScope, entityId: string, label: string, action: string, more: Pick<Recorded, 'changes' | 'why'> = {}): Promise<void> {
    return this.audit.record(manager, { projectId: scope.projectId, actor: scope.actor, action, entity: 'revision', entityId, label, ...more });
  }
}

function visibleTo(scope: ProjectScope): FindOptionsWhere<Revision> {
  return { projectId: scope.projectId, ...(isDesigner(scope) ? {} : { state: In(issuedStates) }) };
}

function requireDraft({ code, state }: Revision): void {
  if (state !== 'draft') throw conflict(message('schedule.not-draft', { code, state: inWords(state) }));
}

function requireChecked(revision: Revision): void {
  const { code, state, issuedBy, issuedAt } = revision;
  if (state === 'issued' && issuedBy && issuedAt) throw conflict(message('schedule.issued-already', { code, by: issuedBy.name, at: issuedAt.toISOString().slice(0, 10) }));
  if (state !== 'checked') throw conflict(message('schedule.not-checked', { code, state: inWords(state) }));
}

function blocked(blockers: readonly OpenItemDto[]) {
  const titles = blockers.slice(0, SAID_BLOCKERS).map((item) => item.title);
  return unprocessable(message('schedule.blocked', { titles, more: blockers.length - titles.length }), blockers.map((item) => ({ path: item.code, message: item.title })));
}

const signature = (by: { id: string; name: string } | null, at: Date | null) => (by && at ? { userId: by.id, name: by.name, at: at.toISOString() } : null);

function signaturesOf(revision: Revision): PdfSignatures {
  return {
    state: revision.state, prepared: signature(revision.preparedBy, revision.preparedAt), checked: signature(revision.checkedBy, revision.checkedAt),
    issued: signature(revision.issuedBy, revision.issuedAt),
  };
}

function toRevisionDto(r: Revision): RevisionDto {
  const { state: _state, ...signed } = signaturesOf(r);
  const { id, code, purpose, state, returnedComment, snapshotSha256, pdfSha256, pdfBytes, members, protectedAreaM2 } = r;
  return { id, code, purpose, state, createdAt: r.createdAt.toISOString(), ...signed, returnedComment, snapshotSha256, pdfSha256, pdfBytes, members, protectedAreaM2 };
}
