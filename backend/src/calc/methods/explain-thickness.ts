import type { WorkingStepDto } from '@mantlet/common';
import { formatLimitTemperature, sentence, thicknessUnit } from '@mantlet/common';
import { explain } from '../formula.js';
import { EVIDENCE_UNIT, coefficientsOf, placeInFits, regressionThickness } from '../standards/en-13381/regression.js';
import { thicknessTableSource } from '../standards/en-13381/thickness-table.js';
import { heatRatioFormula, moistureDwellFormula } from '../standards/en-1993-1-2/clause-4-2-5-2-protected.js';
import type { AssessedProduct, MemberCase, RequiredThickness, ThicknessRequest } from '../types.js';
import { conductivityAt } from './heating-protected.js';
import { protectedTemperature } from './heating.js';
import { heatingOf, placeInThermal } from './thermal-thickness.js';

const sourceOf: Record<AssessedProduct['evidence']['form'], string> = {
  table: `${thicknessTableSource.standard}, ${thicknessTableSource.clause}`,
  regression: 'EN 13381-8, numerical regression analysis (memory)',
  thermal: 'EN 1993-1-2:2005 4.2.5.2 (4.27) with the assessed properties',
};

const unitOf = ({ kind }: AssessedProduct): 'µm' | 'mm' => thicknessUnit[kind];

function regressionSteps(product: AssessedProduct, request: ThicknessRequest): WorkingStepDto[] {
  if (product.evidence.form !== 'regression') return [];
  const place = placeInFits(product.evidence.fits, request);
  if (!place.ok) return [];
  const { fit, temperatureC, sectionFactorPerM } = place.value;
  const { step } = explain(regressionThickness, {
    ...coefficientsOf(fit), temperatureC, sectionFactorPerM, periodMin: Math.max(request.periodMin, fit.minPeriodMin),
  });
  const unit = unitOf(product);
  const inputs = step.inputs.map((input) => (input.unit === EVIDENCE_UNIT ? { ...input, unit } : input));
  return [{ ...step, what: 'Thickness from the regression, solved from its equation for the time', inputs, unit, note: `tested from ${fit.minThickness} to ${fit.maxThickness} ${unit}; less is raised to the least tested, more is refused` }];
}

function thermalSteps(product: AssessedProduct, request: ThicknessRequest, required: RequiredThickness): WorkingStepDto[] {
  if (product.evidence.form !== 'thermal') return [];
  const place = placeInThermal(product.evidence.properties, product.kind, request);
  if (!place.ok) return [];
  const { properties, sectionFactorPerM, temperatureC } = place.value;
  const thicknessM = required.thickness / 1000;
  const { densityKgPerM3, specificHeatJPerKgK, moisturePercent } = properties;
  const ratio = explain(heatRatioFormula, { specificHeatJPerKgK, densityKgPerM3, thicknessM, sectionFactorPerM, steelC: temperatureC });
  const dwell = explain(moistureDwellFormula, {
    moisturePercent, densityKgPerM3, thicknessM, conductivityWPerMK: conductivityAt(properties.conductivityWPerMK, 100),
  });
  const endC = protectedTemperature({ ...heatingOf(place.value, request.curve, required.thickness), minutes: request.periodMin });
  return [
    { ...ratio.step, note: 'c_a at the design temperature; the steps use c_a at each steel temperature' },
    ...(moisturePercent > 0 ? [dwell.step] : []),
    {
      what: 'Protected steel at the end of the period', equation: 'θ_a,t+Δt = θ_a,t + Δθ_a,t in steps of 30 s',
      inputs: [
        { symbol: 'A_p/V', value: sectionFactorPerM, unit: '1/m' }, { symbol: 'd_p', value: required.thickness, unit: 'mm' },
        { symbol: 't', value: request.periodMin, unit: 'min' },
      ],
      note: `not above the design temperature of ${formatLimitTemperature(temperatureC)}`,
      value: endC, unit: '°C', source: sourceOf.thermal,
    },
  ];
}

/** The working of a required thickness, after the fact: each step is evaluated by the descriptor that the reading used. */
export function explainThickness(product: NonNullable<MemberCase['product']>, request: ThicknessRequest, required: RequiredThickness): WorkingStepDto[] {
  const unit = unitOf(product);
  return [
    ...regressionSteps(product, request),
    ...thermalSteps(product, request, required),
    {
      what: `Required thickness of ${product.name}`, equation: 'd_p read from the assessed data',
      inputs: [
        { symbol: 't', value: request.periodMin, unit: 'min' }, { symbol: 'θ_cr', value: request.criticalTemperatureC, unit: '°C' },
        { symbol: 'A_p/V', value: request.sectionFactorPerM, unit: '1/m' },
      ],
      note: required.layers && required.layers.length > 1 ? `${required.reading}; layers ${required.layers.join(' + ')} mm` : required.reading,
      value: required.thickness, unit, source: sourceOf[product.evidence.form],
    },
  ];
}

/** The one step that says why there is no thickness. */
export function refusedStep(reason: Parameters<typeof sentence>[0], source: string): WorkingStepDto {
  return { what: 'Result', equation: '', inputs: [], note: sentence(reason), value: null, unit: '', source };
}
