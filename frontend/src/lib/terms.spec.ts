import { describe, expect, it } from 'vitest';
import { termGroups, termNames, terms } from './terms.js';

describe('the words of the trade', () => {
  it.each(termNames)('%s is put in one or two plain sentences', (name) => {
    const { word, sentence, group } = terms[name];
    expect(termGroups).toContain(group);
    expect(word).toMatch(/^[A-Z]/);
    expect(sentence).toMatch(/^[A-Z].*\.$/);
    expect(sentence).not.toMatch(/[!;<>]|\s{2}/);
    expect(sentence.split(/(?<=[.])\s+(?=[A-Z])/).length).toBeLessThanOrEqual(2);
    expect(sentence.length).toBeGreaterThan(30);
    expect(sentence.length).toBeLessThanOrEqual(180);
  });
  it('no word is explained twice', () => {
    expect(new Set(termNames.map((name) => terms[name].word.toLowerCase())).size).toBe(termNames.length);
  });
  it('a word is not explained by a shorter form of itself alone', () => {
    for (const name of termNames) expect(terms[name].sentence.toLowerCase().startsWith(`${terms[name].word.toLowerCase()} is`)).toBe(false);
  });
});
