import { defaultDesignBasis, memberDesignSchema, productSupplySchema, thermalPropertiesSchema } from '@mantlet/common';
import type { CriticalTemperatureBasis, Evidence, MemberType, ProductKind, RegressionFit, SectionShape, ThicknessTable } from '@mantlet/common';
import { sectionProperties } from '../calc/index.js';
import type { MemberCase } from '../calc/index.js';

/** Park and Miller's minimal standard generator: the same members on every machine. */
export function randomSource(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}

const periods = [30, 45, 60, 90, 120] as const;
const shapes = ['open', 'hollow-rectangular', 'hollow-circular'] as const;
const orientations = ['beam', 'column'] as const;

/** Invented for measurement: thickness proportional to how much faster than the period the steel would heat. */
function inventedTables(): ThicknessTable[] {
  const temperaturesC = [350, 400, 450, 500, 550, 600, 650, 700];
  const sectionFactorsPerM = Array.from({ length: 36 }, (_, i) => 40 + i * 10);
  return shapes.flatMap((shape) => orientations.flatMap((orientation) => periods.map((periodMin) => ({
    shape, orientation, periodMin, temperaturesC, sectionFactorsPerM,
    thickness: sectionFactorsPerM.map((s) => temperaturesC.map((t) => {
      const um = Math.round(120 + periodMin * 0.09 * s * (1 - (t - 350) / 600) * (orientation === 'beam' ? 0.9 : 1));
      return um > 5000 ? null : um;
    })),
  }))));
}

function inventedFits(): RegressionFit[] {
  return shapes.flatMap((shape) => orientations.map((orientation) => ({
    shape, orientation, coefficients: [2, 0.004, 1.2, 0.01, 1e-5, 0.002, 0.9, 300],
    minThickness: 200, maxThickness: 6000, minSectionFactorPerM: 40, maxSectionFactorPerM: 420,
    minTemperatureC: 350, maxTemperatureC: 750, minPeriodMin: 15, maxPeriodMin: 120,
  })));
}

const board = thermalPropertiesSchema.parse({
  conductivityWPerMK: 0.18, densityKgPerM3: 750, specificHeatJPerKgK: 1200, moisturePercent: 3, minThicknessMm: 12, maxThicknessMm: 75,
  minSectionFactorPerM: 30, maxSectionFactorPerM: 420, maxTemperatureC: 750, maxPeriodMin: 180, stockThicknessesMm: [12, 15, 20, 25, 30], maxLayers: 3,
});
const spray = thermalPropertiesSchema.parse({
  conductivityWPerMK: [{ temperatureC: 20, value: 0.07 }, { temperatureC: 400, value: 0.11 }, { temperatureC: 1000, value: 0.21 }],
  densityKgPerM3: 320, specificHeatJPerKgK: 1050, moisturePercent: 2, minThicknessMm: 10, maxThicknessMm: 80,
  minSectionFactorPerM: 30, maxSectionFactorPerM: 420, maxTemperatureC: 750, maxPeriodMin: 180, thicknessStepMm: 1,
});

type Product = NonNullable<MemberCase['product']>;
function product(id: string, kind: ProductKind, evidence: Evidence): Product {
  return { id, kind, evidence, curves: ['standard'], expired: false, name: `Invented ${kind}` };
}
/** Invented products, one of each form of evidence and both kinds of passive material. */
export const inventedProducts: readonly Product[] = [
  product('00000000-0000-4000-8000-000000000001', 'coating', { form: 'table', tables: inventedTables() }),
  product('00000000-0000-4000-8000-000000000002', 'coating', { form: 'regression', fits: inventedFits() }),
  product('00000000-0000-4000-8000-000000000003', 'board', { form: 'thermal', properties: board }),
  product('00000000-0000-4000-8000-000000000004', 'spray', { form: 'thermal', properties: spray }),
];
export const inventedSupply = productSupplySchema.parse({ volumeSolidsPercent: 70 });

function shapeOf(random: () => number): SectionShape {
  const span = (from: number, to: number): number => from + (to - from) * random();
  const kind = random();
  if (kind < 0.7) {
    const hMm = span(140, 620);
    return { kind: 'i', hMm, bMm: Math.min(300, hMm * span(0.42, 0.95)), twMm: span(6, 13), tfMm: span(9, 24), rootRadiusMm: span(8, 24) };
  }
  if (kind < 0.85) {
    const tMm = span(5, 12.5);
    return { kind: 'rectangular-hollow', hMm: span(120, 300), bMm: span(100, 200), tMm, outerRadiusMm: tMm * 1.5, innerRadiusMm: tMm };
  }
  return { kind: 'circular-hollow', dMm: span(110, 300), tMm: span(5, 12.5) };
}

function basisOf(random: () => number, memberType: MemberType, areaMm2: number, plasticMm3: number, yieldMPa: number): CriticalTemperatureBasis {
  const column = memberType === 'column';
  const share = 0.15 + 0.5 * random();
  const effect = {
    axialKn: column ? (share * areaMm2 * yieldMPa * 0.6) / 1000 : 0,
    momentYKnm: column ? 0 : (share * plasticMm3 * yieldMPa) / 1e6,
    momentZKnm: 0,
    shearZKn: 0,
  };
  const bucklingLength = column ? 2500 + 2000 * random() : null;
  return {
    way: 'calculated', reference: 'generated',
    design: memberDesignSchema.parse({ actions: { given: 'fire-effect', effect }, bucklingLengthYMm: bucklingLength, bucklingLengthZMm: bucklingLength, lateralRestraint: 'continuous' }),
  };
}

/** Distinct members: every one with its own section, load, length and section factor. Periods, products and types take turns. */
export function generatedMembers(count: number, seed = 20_261): MemberCase[] {
  const random = randomSource(seed);
  return Array.from({ length: count }, (_, i) => {
    const shape = shapeOf(random);
    const properties = sectionProperties(shape);
    const memberType: MemberType = shape.kind === 'i' && i % 3 !== 0 ? 'beam' : 'column';
    const used = inventedProducts[i % inventedProducts.length] as Product;
    const yieldStrengthMPa = i % 2 === 0 ? 355 : 275;
    return {
      memberType, shape, properties, steel: { grade: `S${yieldStrengthMPa}`, yieldStrengthMPa },
      exposure: { arrangement: memberType === 'beam' ? 'three-sides' as const : 'four-sides' as const, reason: '' },
      protectionForm: used.kind === 'board' ? 'boxed' as const : 'profile' as const,
      basis: basisOf(random, memberType, properties.areaMm2, properties.wplYMm3, yieldStrengthMPa),
      accepted: false, design: defaultDesignBasis,
      readingRules: { sectionFactor: 'linear' as const, temperature: i % 5 === 0 ? 'linear' as const : 'next-below' as const },
      periodMin: periods[Math.floor(random() * periods.length)] as number, curve: { kind: 'standard' as const }, product: used,
    };
  });
}
