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
  /** read: from the source · memory: recalled · second computation: no print, computed independently before this code was written */
  standing: 'read' | 'memory' | 'second computation';
  cases: ValidationCase[];
}
