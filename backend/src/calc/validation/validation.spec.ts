import { validationSets } from './all-cases.js';

describe('published values', () => {
  it('are there', () => {
    expect(validationSets.length).toBeGreaterThan(10);
    for (const set of validationSets) expect(set.cases.length).toBeGreaterThan(0);
  });

  for (const set of validationSets) {
    describe(`${set.source}, ${set.where}`, () => {
      it.each(set.cases.map((c) => [c.what, c] as const))('%s', (_, c) => {
        expect(Number.isFinite(c.expected)).toBe(true);
        expect(c.tolerance).toBeGreaterThanOrEqual(0);
        expect(Math.abs(c.compute() - c.expected)).toBeLessThanOrEqual(c.tolerance);
      });
    });
  }
});
