import { defineFormula } from '../formula.js';

/** Arithmetic of the coating trade, as printed on data sheets: a volume of wet paint leaves its solids behind. */
const source = { standard: 'Common practice of the coating trade', clause: 'volume solids, ISO 3233-1', note: 'ISO 3233-1 defines the volume of non-volatile matter' };

const solids = { symbol: 'VS', meaning: 'volume solids', unit: '%' };
const film = { symbol: 'DFT', meaning: 'dry film thickness', unit: 'µm' };

export const spreadingRate = defineFormula<{ volumeSolidsPercent: number; dryFilmUm: number }>({
  label: 'Theoretical spreading rate',
  source,
  expression: '10·VS/DFT',
  result: { symbol: 'SR', meaning: 'area that a litre covers, without loss', unit: 'm²/L' },
  symbols: { volumeSolidsPercent: solids, dryFilmUm: film },
  evaluate: (i) => (10 * i.volumeSolidsPercent) / i.dryFilmUm,
});

export const practicalLitres = defineFormula<{ areaM2: number; dryFilmUm: number; volumeSolidsPercent: number; lossFraction: number }>({
  label: 'Practical volume of coating',
  source,
  expression: 'A·DFT/(10·VS)/(1 − loss)',
  result: { symbol: 'V', meaning: 'volume to buy', unit: 'L' },
  symbols: {
    areaM2: { symbol: 'A', meaning: 'net area', unit: 'm²' },
    dryFilmUm: film,
    volumeSolidsPercent: solids,
    lossFraction: { symbol: 'loss', meaning: 'share lost in application', unit: '' },
  },
  evaluate: (i) => (i.areaM2 * i.dryFilmUm) / (10 * i.volumeSolidsPercent) / (1 - i.lossFraction),
});

export const wetFilmThickness = defineFormula<{ dryFilmUm: number; volumeSolidsPercent: number }>({
  label: 'Wet film thickness',
  source,
  expression: 'DFT·100/VS',
  result: { symbol: 'WFT', meaning: 'wet film thickness', unit: 'µm' },
  symbols: { dryFilmUm: film, volumeSolidsPercent: solids },
  evaluate: (i) => (i.dryFilmUm * 100) / i.volumeSolidsPercent,
});

export const coatsNeeded = defineFormula<{ dryFilmUm: number; greatestPerCoatUm: number }>({
  label: 'Number of coats',
  source,
  expression: '⌈DFT/DFT_max⌉',
  result: { symbol: 'n', meaning: 'coats', unit: '' },
  symbols: { dryFilmUm: film, greatestPerCoatUm: { symbol: 'DFT_max', meaning: 'greatest dry film of one coat', unit: 'µm' } },
  evaluate: (i) => Math.ceil(i.dryFilmUm / i.greatestPerCoatUm - 1e-9),
});

export const takeoffFormulas = [spreadingRate, practicalLitres, wetFilmThickness, coatsNeeded];
