import { HttpStatus, Injectable } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { ProductDto, ProductInput, ProductSummaryDto, ProductUpdate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, IsNull, Not } from 'typeorm';
import type { EntityManager, FindOptionsWhere } from 'typeorm';
import { checkEvidence } from '../../calc/index.js';
import type { Actor } from '../../shared/access.js';
import { Refusal, conflict, notFound, unprocessable } from '../../shared/refusal.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { AuditService } from '../audit/audit.service.js';
import type { Change, Recorded } from '../audit/audit.service.js';
import { ZoneSystem } from '../zones/zone-system.entity.js';
import { Product } from './product.entity.js';
import { count, productChanges, toProductDto, toProductSummaryDto } from './product-mapping.js';

/** Whose products are meant: a project's own, or the shared library's where there is no project. */
export interface ProductOwner {
  projectId: string | null;
  actor: Actor;
}

/** Protection products with their assessed data: the shared library, and what a project adds for itself. */
@Injectable()
export class ProductsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly assessment: AssessmentService,
    private readonly audit: AuditService,
  ) {}

  /** By kind and name; a project sees the shared library and its own. Zones are counted within the project, else everywhere. */
  async list(projectId: string | null): Promise<ProductSummaryDto[]> {
    const { manager } = this.dataSource;
    // of the evidence only its range goes out; the report itself stays where it is
    const columns = manager.connection.getMetadata(Product).columns.map((column) => column.propertyName).filter((name) => name !== 'evidenceFile');
    const products = await manager.find(Product, {
      where: visibleTo(projectId), select: Object.fromEntries(columns.map((name) => [name, true])), order: { kind: 'ASC', name: 'ASC', evidenceEdition: 'ASC' },
    });
    const uses: { id: string; zones: string }[] = await manager.query(
      `SELECT s.product_id AS id, count(DISTINCT z.id) AS zones
         FROM zone_systems s JOIN zones z ON z.id = s.zone_id
        WHERE $1::uuid IS NULL OR z.project_id = $1
        GROUP BY s.product_id`,
      [projectId],
    );
    const zones = new Map(uses.map((use) => [use.id, Number(use.zones)]));
    return products.map((product) => toProductSummaryDto(product, zones.get(product.id) ?? 0));
  }

  async get(projectId: string | null, productId: string): Promise<ProductDto> {
    const product = await this.dataSource.manager.findOne(Product, { where: visibleTo(projectId).map((where) => ({ ...where, id: productId })) });
    if (!product) throw notFound('product');
    return toProductDto(product);
  }

  async create(owner: ProductOwner, input: ProductInput): Promise<ProductDto> {
    requireSoundEvidence(input);
    return this.dataSource.transaction(async (manager) => {
      await this.requireFreeName(manager, owner.projectId, input, null);
      const product = await manager.save(manager.create(Product, { ...input, projectId: owner.projectId }));
      await this.record(manager, owner, 'product made', product, productChanges({}, input));
      return toProductDto(product);
    });
  }

  /** Members that the product protects are assessed anew, in every project that uses it. */
  async update(owner: ProductOwner, productId: string, { version, ...input }: ProductUpdate): Promise<ProductDto> {
    requireSoundEvidence(input);
    return this.dataSource.transaction(async (manager) => {
      const product = await this.lock(manager, owner, productId, 'for_no_key_update');
      await this.audit.requireVersion(manager, 'product', product, version, () => toProductDto(product));
      const changes = productChanges(product, input);
      if (!changes.length) return toProductDto(product);
      await this.requireFreeName(manager, owner.projectId, input, productId);
      await manager.save(Object.assign(product, input));
      await this.record(manager, owner, 'product changed', product, changes);
      await this.reassess(manager, owner, product, changes);
      return toProductDto(product);
    });
  }

  /** Only one that no zone uses. */
  async remove(owner: ProductOwner, productId: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const product = await this.lock(manager, owner, productId, 'pessimistic_write');
      const zones = await this.zonesUsing(manager, productId);
      if (zones.length) throw conflict(message('shared.in-use', { what: 'product', by: count(zones.length, 'zone') }));
      await manager.delete(Product, productId);
      await this.record(manager, owner, 'product deleted', product, []);
    });
  }

  /** The owner's product, locked for the rest of the transaction. A project's people learn why they cannot change a shared one. */
  async lock(manager: EntityManager, owner: ProductOwner, productId: string, mode: 'for_no_key_update' | 'pessimistic_write'): Promise<Product> {
    const product = await manager.findOne(Product, { where: { id: productId, projectId: owner.projectId ?? IsNull() }, lock: { mode } });
    if (product) return product;
    if (owner.projectId !== null && (await manager.existsBy(Product, { id: productId, projectId: IsNull() }))) {
      throw new Refusal(HttpStatus.FORBIDDEN, message('shared.forbidden', { who: 'the administrator', what: 'change a product of the shared library' }));
    }
    throw notFound('product');
  }

  record(manager: EntityManager, { projectId, actor }: ProductOwner, action: string, product: Product, changes: Change[]): Promise<void> {
    return this.audit.record(manager, trace({ projectId, actor }, action, product, changes));
  }

  private async reassess(manager: EntityManager, owner: ProductOwner, product: Product, changes: Change[]): Promise<void> {
    const zonesOf = new Map<string, string[]>();
    for (const { projectId, zoneId } of await this.zonesUsing(manager, product.id)) zonesOf.set(projectId, [...(zonesOf.get(projectId) ?? []), zoneId]);
    // always in the same order, so that two edits cannot wait for each other
    for (const projectId of [...zonesOf.keys()].sort()) {
      // a shared product's change belongs in the trail of each project it touches
      if (owner.projectId === null) await this.audit.record(manager, trace({ projectId, actor: owner.actor }, 'shared product changed', product, changes));
      await this.assessment.recompute(manager, projectId, zonesOf.get(projectId) ?? []);
    }
  }

  private async zonesUsing(manager: EntityManager, productId: string): Promise<{ projectId: string; zoneId: string }[]> {
    const systems = await manager.find(ZoneSystem, { where: { productId }, relations: { zone: true } });
    return [...new Map(systems.map(({ zoneId, zone }) => [zoneId, { projectId: zone.projectId, zoneId }])).values()];
  }

  private async requireFreeName(manager: EntityManager, projectId: string | null, input: ProductInput, exceptId: string | null): Promise<void> {
    const taken = await manager.existsBy(Product, {
      projectId: projectId ?? IsNull(), name: input.name, evidenceEdition: input.evidenceEdition, ...(exceptId ? { id: Not(exceptId) } : {}),
    });
    if (taken) throw conflict(message('shared.exists', { what: 'product', name: `${input.name}, ${input.evidenceEdition}` }));
  }
}

function visibleTo(projectId: string | null): FindOptionsWhere<Product>[] {
  return projectId === null ? [{ projectId: IsNull() }] : [{ projectId: IsNull() }, { projectId }];
}

function trace({ projectId, actor }: ProductOwner, action: string, product: Product, changes: Change[]): Recorded {
  return { projectId, actor, action, entity: 'product', entityId: product.id, label: `${product.name}, ${product.evidenceEdition}`, changes };
}

/** Every fault of the evidence at once, each a sentence. */
function requireSoundEvidence(input: ProductInput): void {
  const faults = checkEvidence(input.evidence, input.kind);
  const [first] = faults;
  if (first) throw unprocessable(first, faults.slice(0, 50).map((fault) => ({ path: 'evidence', message: sentence(fault) })));
}
