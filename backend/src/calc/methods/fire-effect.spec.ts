import { actionsSchema, defaultDesignBasis } from '@mantlet/common';
import { fireEffect, reductionFactorEtaFi } from './fire-effect.js';
import type { EffectActions } from './fire-effect.js';

describe('effects in fire (EN 1990 6.4.3.3)', () => {
  const actions = actionsSchema.parse({
    given: 'characteristic', permanent: { momentYKnm: 60, shearZKn: 40 }, leading: { momentYKnm: 50, shearZKn: 30, category: 'C' },
    accompanying: [{ momentYKnm: 20, shearZKn: 10, category: 'A' }, { momentYKnm: -100, category: 'E' }],
  }) as EffectActions;

  it('adds ψ_1 of the leading and ψ_2 of the accompanying actions; a favourable one is left out', () => {
    // 60 + 0.7·50 + 0.3·20 = 101; 40 + 0.7·30 + 0.3·10 = 64 (ψ of EN 1990 Table A1.1)
    const effect = fireEffect(actions, defaultDesignBasis);
    expect(effect.momentYNmm / 1e6).toBeCloseTo(101, 9);
    expect(effect.shearZN / 1e3).toBeCloseTo(64, 9);
    expect([effect.compressionN, effect.tensionN]).toEqual([0, 0]);
  });

  it('uses ψ_2 for the leading action where the project says so', () => {
    const effect = fireEffect(actions, { ...defaultDesignBasis, psiFi: 'psi2' });
    expect(effect.momentYNmm / 1e6).toBeCloseTo(60 + 0.6 * 50 + 0.3 * 20, 9);
  });

  it('finds the reversed moment where that is greater', () => {
    const reversed = actionsSchema.parse({ given: 'characteristic', permanent: { momentYKnm: 10 }, leading: { momentYKnm: -100, category: 'B' } }) as EffectActions;
    expect(fireEffect(reversed, defaultDesignBasis).momentYNmm / 1e6).toBeCloseTo(40, 9);
  });

  it('prints the combination it used', () => {
    const working: Parameters<typeof fireEffect>[2] = [];
    fireEffect(actions, defaultDesignBasis, working);
    expect(working!.map((s) => [s.what, s.value])).toEqual([
      ['Effect of actions in fire: bending moment about y', 101], ['Effect of actions in fire: shear force', 64],
    ]);
  });

  it('gives η_fi by 2.4.2 (2.5): equal loads and ψ = 0.5 give 1.5/2.85', () => {
    expect(reductionFactorEtaFi(100, 100, 0.5, defaultDesignBasis)).toBeCloseTo(0.5263, 4);
  });
});
