import { unstorable } from './storable.js';

describe('text that cannot be stored', () => {
  it.each([
    ['ordinary text of any kind', { mark: 'B-1', note: '🔥 \u202Eטרז e\u0301 \n', list: [1, null, true] }, null],
    ['a zero byte', { mark: 'a\0b' }, ['mark']],
    ['half a character', { list: [{ note: 'a' }, { note: '\ud83dx' }] }, ['list', '1', 'note']],
    ['a half as a key', { psi: { '\udd25': 1 } }, ['psi', '\udd25']],
    ['a half alone', '\udd25', []],
  ])('is found: %s', (_, value, at) => expect(unstorable(value)).toEqual(at));
});
