/** The package ships no types. */
declare module 'pg-copy-streams' {
  import type { Writable } from 'node:stream';
  import type { Submittable } from 'pg';
  export function from(command: string): Writable & Submittable;
}
