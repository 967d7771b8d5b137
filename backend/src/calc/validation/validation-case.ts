/** One published value and how the core arrives at it. */
export interface ValidationCase {
  what: string;
  expected: number;
  /** greatest difference accepted, in the unit of the value */
  tolerance: number;
  /** why the tolerance is wider than the last printed digit */
  toleranceReason?: string;
  unit: string;
  compute: () => number;
}

/** All the cases of one source. */
export interface ValidationSet {
  source: string;
  /** clause, table or page */
  where: string;
  /**
   * published: as published in the source, taken from a compilation and not read again in print · memory: recalled ·
   * second computation: no print, computed independently before this code was written · own check: an identity or limit that holds by the
   * source's own equations
   */
  standing: 'published' | 'memory' | 'second computation' | 'own check';
  cases: ValidationCase[];
}
