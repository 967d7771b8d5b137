import type { ColumnOptions } from 'typeorm';

/** Marks, codes and designations: told apart as typed, ordered as people do, B2 before B10 (the migration makes the collation). */
export const natural: ColumnOptions = { type: 'text', collation: 'natural' };
export const timestamp: ColumnOptions = { type: 'timestamptz' };
export const nullableTimestamp: ColumnOptions = { type: 'timestamptz', nullable: true };

/** Engineering numbers are binary floats; money never is (it lives in jsonb as decimal strings). */
export const measure: ColumnOptions = { type: 'double precision' };
export const nullableMeasure: ColumnOptions = { type: 'double precision', nullable: true };
