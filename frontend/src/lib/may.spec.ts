import { describe, expect, it } from 'vitest';
import { may, rolesInWords, whyNot } from './may.js';

describe('rights', () => {
  it('gives each decision to the role that decides it', () => {
    expect(may(['fire-engineer'], 'edit-zones')).toBe(true);
    expect(may(['structural-engineer', 'specifier'], 'edit-zones')).toBe(false);
    expect(may(['structural-engineer'], 'edit-structural')).toBe(true);
    expect(may(['fire-engineer', 'specifier'], 'edit-structural')).toBe(false);
    expect(may(['specifier'], 'edit-protection')).toBe(true);
  });
  it('shows work in progress to no contractor, inspector or reader', () => {
    expect(may(['contractor', 'inspector', 'reader'], 'see-design')).toBe(false);
    expect(may([], 'see-design')).toBe(false);
    expect(may(['reader', 'specifier'], 'see-design')).toBe(true);
  });
  it('says who may', () => {
    expect(whyNot('edit-levels')).toBe('Only the fire engineer may change levels.');
    expect(whyNot('edit-team')).toBe('Only the fire engineer or the specifier may change the team.');
    expect(rolesInWords(['specifier', 'fire-engineer'])).toBe('Specifier and fire engineer');
  });
});
