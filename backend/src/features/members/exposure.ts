import type { Exposure } from '@mantlet/common';

/** Named faces belong to "faces as given" alone. */
export function tidy(exposure: Exposure): Exposure {
  const { arrangement, faces, reason } = exposure;
  return arrangement === 'given-faces' ? { arrangement, faces: [...new Set(faces)], reason } : { arrangement, reason };
}
