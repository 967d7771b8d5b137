import { describe, expect, it } from 'vitest';
import type { WorkingStepDto } from '@mantlet/common';
import { figure, resultParts, resultText, workingAsText, workingLine } from './working.js';

const step = (equation: string, inputs: WorkingStepDto['inputs']): WorkingStepDto => ({ what: '', equation, inputs, value: 1, unit: '', source: '' });
const input = (symbol: string, value: number, unit = '') => ({ symbol, value, unit });

describe('workingLine', () => {
  it('puts numbers for symbols, the longer symbol first', () => {
    const line = workingLine(step('A_m/V = A_m/A·1000', [input('A_m', 1442, 'mm'), input('A', 8551, 'mm²')]));
    expect(line.numbers).toBe('1442/8551·1000');
    expect(line.rest).toEqual([]);
  });
  it('never puts a number inside a symbol or a subscript', () => {
    const line = workingLine(step('θ_a,t+Δt = θ_a,t + Δθ_a,t in steps of 5 s', [input('t', 90, 'min')]));
    expect(line.numbers).toBeNull();
    expect(line.rest).toEqual([{ symbol: 't', text: '90\u00a0min' }]);
    expect(workingLine(step('V = A_v·k/A', [input('A', 2), input('k', 3)])).numbers).toBe('A_v·3/2');
  });
  it('takes composed symbols whole', () => {
    expect(workingLine(step('E_fi,d = G_k + ψ_fi·Q_k,1', [input('G_k', 211), input('ψ_fi·Q_k,1', 119)])).numbers).toBe('211 + 119');
    expect(workingLine(step('λ̄_θ = λ̄·√(k_y,θ/k_E,θ)', [input('λ̄', 0.3626), input('k_y,θ', 0.2974), input('k_E,θ', 0.1806)])).numbers).toBe('0.3626·√(0.2974/0.1806)');
  });
  it('lists what enters without a printed symbol', () => {
    expect(workingLine(step('k_y,θ by Table 3.1', [input('θ_a', 578.343, '°C')])).rest).toEqual([{ symbol: 'θ_a', text: '578.3\u00a0°C' }]);
  });
});

describe('figures', () => {
  it.each([[0.5371366, '0.5371'], [1471023.99, '1\u202f471\u202f024'], [355, '355'], [168.638, '168.6'], [0, '0'], [-12.5, '\u221212.5'], [0.00012, '0.00012']])('%d is %s', (value, text) => {
    expect(figure(value)).toBe(text);
  });
  it('reads forces in the unit people use, and no value as none', () => {
    expect(resultText({ value: 522_213_518, unit: 'N·mm' })).toBe('522.2\u00a0kNm');
    expect(resultText({ value: 839_172.98, unit: 'N' })).toBe('839.2\u00a0kN');
    expect(resultText({ value: null, unit: '°C' })).toBeNull();
  });
  it('never shows a limit temperature higher than it is', () => {
    expect(resultText({ value: 615.98, unit: '°C' })).toBe('615.9\u00a0°C');
    expect(resultText({ value: 615, unit: '°C' })).toBe('615.0\u00a0°C');
    expect(workingLine(step('k_y,θ by Table 3.1', [input('θ_a', 615.98, '°C')])).rest[0]?.text).toBe('615.9\u00a0°C');
  });
});

describe('the working in columns and as text', () => {
  it('parts a result at its decimal mark', () => {
    expect(resultParts({ value: 522_213_518, unit: 'N·mm' })).toEqual({ whole: '522', fraction: '.2', unit: 'kNm' });
    expect(resultParts({ value: 1, unit: '' })).toEqual({ whole: '1', fraction: '', unit: '' });
    expect(resultParts({ value: null, unit: 'mm' })).toBeNull();
  });
  it('copies every step with its numbers, result and source', () => {
    const step = { what: 'Section factor', equation: 'A_m/V = A_m/A·1000', inputs: [{ symbol: 'A_m', value: 1442, unit: 'mm' }, { symbol: 'A', value: 8551, unit: 'mm²' }], value: 168.6, unit: '1/m', source: 'EN 1993-1-2 Table 4.2' };
    expect(workingAsText('Member B2-014', [step])).toBe('Member B2-014\n\n1  Section factor: 168.6\u00a0m⁻¹\n   A_m/V = A_m/A·1000\n   = 1442/8551·1000\n   EN 1993-1-2 Table 4.2');
  });
});
