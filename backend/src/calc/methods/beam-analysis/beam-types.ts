/** One span between two supports. Left is x = 0. A cantilever is built in at the left and free at the right. */
export type BeamSupports = 'simple' | 'propped' | 'fixed' | 'cantilever';

/** Downward loads are positive. A distributed load runs straight from one intensity to the other. */
export type BeamLoad =
  | { kind: 'point'; atMm: number; forceN: number }
  | { kind: 'distributed'; fromMm: number; toMm: number; startNPerMm: number; endNPerMm: number };

export interface Beam {
  supports: BeamSupports;
  spanMm: number;
  loads: readonly BeamLoad[];
}

export const isIndeterminate = (supports: BeamSupports): boolean => supports === 'propped' || supports === 'fixed';
