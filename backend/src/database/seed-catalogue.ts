import type { DataSource } from 'typeorm';

export async function seedCatalogue(_dataSource: DataSource): Promise<number> {
  return 0;
}
