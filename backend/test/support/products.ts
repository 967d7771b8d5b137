import type { ProductInput, ThicknessTable } from '@mantlet/common';

/** Invented for these tests: no real product behaves like this. Thickness in µm rises with A/V and falls with temperature. */
export function inventedTable(periodMin: ThicknessTable['periodMin'] = 60, orientation: ThicknessTable['orientation'] = 'beam'): ThicknessTable {
  const temperaturesC = [350, 450, 550, 650];
  const sectionFactorsPerM = [60, 120, 180, 240, 300];
  const thickness = sectionFactorsPerM.map((a) => temperaturesC.map((t) => Math.round((a * periodMin * 30) / t)));
  return { shape: 'open', orientation, periodMin, temperaturesC, sectionFactorsPerM, thickness };
}

/** An invented coating with tables for open beams and columns at R 30, 60 and 90. */
export function inventedCoating(more: Partial<ProductInput> = {}): ProductInput {
  const tables = ([30, 60, 90] as const).flatMap((period) => [inventedTable(period, 'beam'), inventedTable(period, 'column')]);
  return {
    name: 'Test coating', maker: 'Invented for tests', kind: 'coating', invented: true, evidenceReference: 'TEST 1', evidenceEdition: '1', evidenceExpiresOn: '2099-12-31',
    evidenceStandard: 'EN 13381-8', curves: ['standard'], environments: ['C1'], note: '',
    evidence: { form: 'table', tables },
    supply: {
      volumeSolidsPercent: 70, maxDftPerCoatUm: 800, densityKgPerL: 1.3, containerL: 20, lossFraction: 0.2, sheetLengthMm: null, sheetWidthMm: null,
      bagKg: null, bagYieldM3: null, materialRate: '12.50', labourRate: '20.00',
    },
    ...more,
  };
}
