import { Injectable } from '@nestjs/common';
import { Decimal, formatDecimal, formatNumber, message, sumDecimals } from '@mantlet/common';
import type { ProductKind, PurchaseDto, QuantitiesDto, QuantityLineDto, QuantityQuery, SnapshotQuantities } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import { defaultKerfMm, splitQuantities, takeoff, withMarkUp } from '../../calc/index.js';
import type { Takeoff, TakeoffMember } from '../../calc/index.js';
import type { ProjectInputs } from '../assessment/project-inputs.service.js';
import { ProjectInputsService } from '../assessment/project-inputs.service.js';
import { conflict } from '../../shared/refusal.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { csvOf, linesTable } from './quantity-table.js';
import { workbookOf } from './quantity-workbook.js';

/** What one product covers in the project, as the building page shows it. */
export interface ProductTotal {
  productId: string;
  productName: string;
  kind: ProductKind;
  members: number;
  /** net area, m², 2 decimals */
  areaM2: number;
  /** what to buy, in words: "1,240 L", "312 sheets", "4.2 m³"; null where the product's supply data lack something */
  net: string | null;
}

/** decimal places of every currency a project can have */
const MONEY_PLACES = 2;

/** Quantities of material from the results as they stand. The arithmetic is in calc; here the members are gathered and named. */
@Injectable()
export class QuantitiesService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly inputs: ProjectInputsService,
    private readonly assessment: AssessmentService,
  ) {}

  /** Split by the two keys of the query; every split is a sum of the same printed lines. */
  async split(projectId: string, query: QuantityQuery): Promise<QuantitiesDto> {
    const { manager } = this.dataSource;
    const inputs = await this.inputs.load(manager, projectId, null);
    const { lines, purchases } = await this.takeoffOf(manager, inputs, query.delivery);
    const split = splitQuantities(lines, query.rows, query.columns);
    const { markUpPercent } = inputs.project.settings;
    const priced = withMarkUp(split.total.cost, markUpPercent, MONEY_PLACES);
    return {
      currency: inputs.project.currency, lines, split, purchases, markUpPercent, markUp: priced.markUp, totalWithMarkUp: priced.total,
      unassessed: await this.assessment.unassessed(manager, projectId), names: namesOf(inputs),
    };
  }

  /** As a snapshot freezes them: by level and product, bought once for the project. */
  async frozen(manager: EntityManager, inputs: ProjectInputs): Promise<SnapshotQuantities> {
    const members = await this.assessment.takeoffMembers(manager, inputs);
    const { lines, purchases } = takeoffBy(members, inputs, 'project');
    const { purchases: purchasesByLevel } = takeoffBy(members, inputs, 'level');
    const byLevelAndProduct = splitQuantities(lines, 'level', 'product');
    const { markUpPercent } = inputs.project.settings;
    const priced = withMarkUp(byLevelAndProduct.total.cost, markUpPercent, MONEY_PLACES);
    return { lines, byLevelAndProduct, purchases, purchasesByLevel, markUpPercent, markUp: priced.markUp, totalWithMarkUp: priced.total };
  }

  /** Of the whole project's inputs. */
  async totalsByProduct(inputs: ProjectInputs): Promise<ProductTotal[]> {
    const { lines, purchases } = await this.takeoffOf(this.dataSource.manager, inputs, 'project');
    return purchases.map((purchase) => {
      const own = lines.filter((line) => line.productId === purchase.productId);
      return {
        productId: purchase.productId, productName: inputs.products.get(purchase.productId)?.name ?? '', kind: purchase.kind,
        members: own.reduce((sum, line) => sum + line.marks, 0), areaM2: sumDecimals(own.map((line) => line.netM2)).toNumber(), net: inWords(purchase, own),
      };
    });
  }

  async linesCsv(projectId: string): Promise<string> {
    const { manager } = this.dataSource;
    requireComplete(await this.assessment.unassessed(manager, projectId));
    const inputs = await this.inputs.load(manager, projectId, null);
    const { lines } = await this.takeoffOf(manager, inputs, 'project');
    return csvOf(linesTable(lines, namesOf(inputs), inputs.project.currency));
  }

  async workbook(projectId: string, query: QuantityQuery): Promise<{ name: string; content: Buffer }> {
    const quantities = await this.split(projectId, query);
    requireComplete(quantities.unassessed);
    return { name: 'quantities.xlsx', content: await workbookOf(quantities, query) };
  }

  private async takeoffOf(manager: EntityManager, inputs: ProjectInputs, delivery: QuantityQuery['delivery']): Promise<Takeoff> {
    return takeoffBy(await this.assessment.takeoffMembers(manager, inputs), inputs, delivery);
  }
}

/** A file goes its own way; what is incomplete must not. */
function requireComplete(members: number): void {
  if (members > 0) throw conflict(message('job.recalculating', { members }));
}

function takeoffBy(members: readonly TakeoffMember[], inputs: ProjectInputs, delivery: QuantityQuery['delivery']): Takeoff {
  const result = takeoff(members, [...inputs.products.values()], {
    deductions: inputs.project.settings.deductions, delivery, kerfMm: defaultKerfMm, moneyPlaces: MONEY_PLACES,
  });
  return { ...result, lines: sorted(result.lines, inputs) };
}

/** From the ground up, then by zone, product and rising thickness. */
function sorted(lines: readonly QuantityLineDto[], inputs: ProjectInputs): QuantityLineDto[] {
  // zones come in the order of their levels
  const zones = new Map(inputs.zones.map((zone, i) => [zone.id, i]));
  const name = (line: QuantityLineDto): string => inputs.products.get(line.productId)?.name ?? '';
  return [...lines].sort((a, b) =>
    (zones.get(a.zoneId) ?? 0) - (zones.get(b.zoneId) ?? 0) || name(a).localeCompare(name(b)) || a.thickness - b.thickness
    || a.memberType.localeCompare(b.memberType) || a.profile.localeCompare(b.profile) || Number(b.onSite) - Number(a.onSite));
}

export function namesOf(inputs: ProjectInputs): Record<string, string> {
  return Object.fromEntries([
    ...inputs.levels.map((l) => [l.id, `${l.code} ${l.name}`]),
    ...inputs.zones.map((z) => [z.id, `${z.code} ${z.name}`]),
    ...[...inputs.products.values()].map((p) => [p.id, p.name]),
  ]);
}

/** What to buy of a product, in words; null where its supply data lack something. */
export function inWords(purchase: PurchaseDto, lines: readonly QuantityLineDto[]): string | null {
  if (purchase.kind === 'coating') return purchase.litres && `${formatDecimal(new Decimal(purchase.litres).toFixed(0, Decimal.ROUND_UP))} L`;
  if (purchase.kind === 'board') return purchase.boards.length === 0 ? null : `${formatNumber(purchase.boards.reduce((sum, plan) => sum + plan.sheets, 0))} sheets`;
  const own = lines.filter((line) => line.productId === purchase.productId);
  return `${formatDecimal(sumDecimals(own.map((line) => line.volumeM3)).toFixed(2))} m³`;
}
