import { DefaultNamingStrategy } from 'typeorm';

/** snake_case in the database, camelCase in code. */
export class SnakeNamingStrategy extends DefaultNamingStrategy {
  override columnName(propertyName: string, customName: string | undefined): string {
    return customName ?? propertyName.replace(/([a-z\d])([A-Z])/g, '$1_$2').replace(/([A-Za-z])(\d)(?=$|[A-Z])/g, '$1$2').toLowerCase();
  }
}
