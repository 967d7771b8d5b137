import type { DataSource } from 'typeorm';

/** A digest of every row of every table but the sessions: equal where nothing whatever was written. */
export async function digestOfEverything(dataSource: DataSource): Promise<Record<string, string>> {
  const tables: { name: string }[] = await dataSource.query(
    `SELECT table_name AS name FROM information_schema.tables WHERE table_schema = 'public' AND table_type = 'BASE TABLE' AND table_name <> 'session' ORDER BY 1`,
  );
  const digests: Record<string, string> = {};
  for (const { name } of tables) {
    const [row]: { digest: string | null }[] = await dataSource.query(`SELECT md5(string_agg(md5(t::text), '' ORDER BY md5(t::text))) AS digest FROM "${name}" t`);
    digests[name] = row?.digest ?? 'empty';
  }
  return digests;
}
