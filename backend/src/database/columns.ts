import type { ColumnOptions } from 'typeorm';

/** Codes, marks, names: compared as typed, unique per owner. */
export const timestamp: ColumnOptions = { type: 'timestamptz' };
export const nullableTimestamp: ColumnOptions = { type: 'timestamptz', nullable: true };

/** Engineering numbers are binary floats; money never is (it lives in jsonb as decimal strings). */
export const measure: ColumnOptions = { type: 'double precision' };
export const nullableMeasure: ColumnOptions = { type: 'double precision', nullable: true };
