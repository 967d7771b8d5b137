import type { SectionShape } from '@mantlet/common';

/** A frame uses a few dozen sections and the catalogue has some thousands; beyond this the oldest half is let go. */
const mostRemembered = 8192;

/**
 * The same function, worked out once for each set of dimensions. Its answers depend on nothing but the shape, so keeping
 * them changes no result. A shape object must not be changed after it was passed here.
 */
export function rememberByShape<T extends object>(compute: (shape: SectionShape) => T): (shape: SectionShape) => T {
  const byObject = new WeakMap<SectionShape, T>();
  const byDimensions = new Map<string, T>();
  return (shape) => {
    const known = byObject.get(shape);
    if (known) return known;
    // names are part of the key, so the order of the fields can at worst cost a second computation
    const key = JSON.stringify(shape);
    let result = byDimensions.get(key);
    if (!result) {
      result = compute(shape);
      if (byDimensions.size >= mostRemembered) {
        for (const old of [...byDimensions.keys()].slice(0, mostRemembered / 2)) byDimensions.delete(old);
      }
      byDimensions.set(key, result);
    }
    byObject.set(shape, result);
    return result;
  };
}
