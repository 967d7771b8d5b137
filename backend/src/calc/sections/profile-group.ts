import type { ProfileGroup, SectionKind, SectionShape } from '@mantlet/common';

const groups: Record<SectionKind, ProfileGroup> = {
  i: 'open', 'i-unequal': 'open', channel: 'open', tee: 'open', angle: 'open',
  'rectangular-hollow': 'hollow-rectangular', box: 'hollow-rectangular', 'circular-hollow': 'hollow-circular',
  flat: 'solid', round: 'solid',
};

/** The group under which protection evidence lists a shape; a welded box counts as a rectangular hollow section. */
export function profileGroup(shape: SectionShape): ProfileGroup {
  return groups[shape.kind];
}
