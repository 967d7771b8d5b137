/**
 * A worker that lives holds a lock of the database on its name; the database lets go of it when the connection ends, however it
 * ended. So anybody can see which workers live, and no clock has to be believed.
 */
export const WORKER_LOCKS = 1_296_125_524;

/** $1 the worker's name */
export const HOLD_LOCK = `SELECT pg_advisory_lock(${WORKER_LOCKS}, hashtext($1))`;

const held = `SELECT objid FROM pg_locks WHERE locktype = 'advisory' AND classid = ${WORKER_LOCKS} AND granted
  AND database = (SELECT oid FROM pg_database WHERE datname = current_database())`;
export const ANY_WORKER = `SELECT EXISTS (${held}) AS alive`;

/** names under which jobs are held though nobody of that name lives */
export const DEAD_WORKERS = `SELECT DISTINCT locked_by AS name FROM graphile_worker.jobs
  WHERE locked_by IS NOT NULL AND locked_at < now() - interval '3 seconds' AND hashtext(locked_by)::oid NOT IN (${held})`;
