import { DefaultNamingStrategy } from 'typeorm';

const snake = (name: string): string => name.replace(/([a-z0-9])([A-Z])/g, '$1_$2').toLowerCase();

/** Columns are snake_case in PostgreSQL and camelCase in code. */
export class SnakeNaming extends DefaultNamingStrategy {
  override columnName(propertyName: string, customName: string | undefined): string {
    return customName ?? snake(propertyName);
  }
}
