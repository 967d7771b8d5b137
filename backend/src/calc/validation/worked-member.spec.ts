import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { defaultDesignBasis, memberDesignSchema } from '@mantlet/common';
import type { Exposure, SectionShape } from '@mantlet/common';
import { criticalTemperature } from '../methods/critical-temperature.js';
import { fireEffect } from '../methods/fire-effect.js';
import type { EffectActions } from '../methods/fire-effect.js';
import { bareMinutes, unprotectedTemperature } from '../methods/heating.js';
import { sectionFactor, sectionProperties } from '../sections/index.js';
import { sectionClass, yieldStrength } from '../standards/index.js';
import { fireEpsilonFormula } from '../standards/en-1993-1-2/clause-4-2-2-classification.js';

/** every row of the document's tables: its symbol and the number printed in its last column */
function printedRows(): [string, string][] {
  const text = readFileSync(join(__dirname, '../../../../docs/worked-member.md'), 'utf8');
  const rows = text.split('\n').filter((line) => line.startsWith('| ') && !line.startsWith('| symbol'));
  return rows.map((line) => {
    const cells = line.split('|').map((c) => c.trim());
    return [cells[1]!, cells[3]!.split(' ')[0]!];
  });
}

function programValues(): Record<string, number> {
  const shape: SectionShape = { kind: 'i', hMm: 400, bMm: 180, twMm: 8.6, tfMm: 13.5, rootRadiusMm: 21 };
  const properties = sectionProperties(shape);
  const exposure: Exposure = { arrangement: 'three-sides', reason: '' };
  const steel = yieldStrength('S355', 13.5);
  const factor = sectionFactor(shape, properties, exposure, 'profile');
  if (!steel.ok || !factor.ok) throw new Error('the worked member is not refused');
  const actions = {
    given: 'characteristic',
    permanent: { momentYKnm: (18 * 7.5 ** 2) / 8, shearZKn: (18 * 7.5) / 2 },
    leading: { category: 'B', momentYKnm: (20 * 7.5 ** 2) / 8, shearZKn: (20 * 7.5) / 2 },
  };
  const design = memberDesignSchema.parse({ actions, lateralRestraint: 'continuous' });
  const effect = fireEffect(design.actions as EffectActions, defaultDesignBasis);
  const result = criticalTemperature({
    basis: { way: 'calculated', design, reference: 'worked member' }, memberType: 'secondary-beam', shape, properties,
    steel: { grade: 'S355', yieldStrengthMPa: steel.value }, exposure, design: defaultDesignBasis, accepted: false,
  });
  const found = sectionClass(shape, 'bending', steel.value);
  if (result.kind !== 'determined' || !found.ok) throw new Error('the worked member is determined');
  const bending = result.limitStates.find((s) => s.name === 'bending')!;
  const shear = result.limitStates.find((s) => s.name === 'shear')!;
  expect(result.governing).toBe('bending');
  const heating = {
    sectionFactorPerM: factor.value.sectionFactorPerM, shadowFactor: factor.value.shadowFactorNominal, curve: { kind: 'standard' } as const, emissivity: defaultDesignBasis.emissivitySteel,
  };
  const bareAt = (minutes: number) => unprotectedTemperature({ ...heating, minutes });
  return {
    M_G: actions.permanent.momentYKnm, M_Q: actions.leading.momentYKnm, V_G: actions.permanent.shearZKn, V_Q: actions.leading.shearZKn,
    'M_fi,Ed': effect.momentYNmm / 1e6, 'V_fi,Ed': effect.shearZN / 1e3,
    A: properties.areaMm2, 'W_pl,y': properties.wplYMm3, A_v: properties.shearAreaZMm2, A_m: factor.value.heatedPerimeterMm,
    'A_m/V': factor.value.sectionFactorPerM, '[A_m/V]_b': factor.value.boxSectionFactorPerM, k_sh: factor.value.shadowFactorNominal,
    ε: fireEpsilonFormula.evaluate({ yieldStrengthMPa: steel.value }), class: found.value,
    'M_fi,0,Rd': bending.resistanceCold, 'V_fi,0,Rd': shear.resistanceCold, μ_M: bending.utilisation, μ_V: shear.utilisation,
    θ_M: bending.temperatureC, θ_V: shear.temperatureC, θ_cr: result.temperatureC, 'θ_cr,bare': result.bareTemperatureC,
    'θ_a at 5 s': bareAt(5 / 60), 'θ_a at 10 s': bareAt(10 / 60), 'θ_a at 15 s': bareAt(15 / 60),
    'θ_a at 5 min': bareAt(5), 'θ_a at 10 min': bareAt(10), 'θ_a at 20 min': bareAt(20), 'θ_a at 30 min': bareAt(30),
    t_bare: bareMinutes({ ...heating, targetC: result.bareTemperatureC })!,
  };
}

describe('docs/worked-member.md', () => {
  const rows = printedRows();
  const values = programValues();

  it('prints every value the program is asked for', () => {
    expect(rows.length).toBeGreaterThan(25);
    expect(rows.map(([symbol]) => symbol).sort()).toEqual(Object.keys(values).sort());
  });

  it.each(rows)('%s = %s', (symbol, text) => {
    const decimals = text.split('.')[1]?.length ?? 0;
    expect(values[symbol]!.toFixed(decimals)).toBe(text);
  });
});
