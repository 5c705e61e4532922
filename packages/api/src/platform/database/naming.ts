import { DefaultNamingStrategy } from 'typeorm';

const snake = (name: string) => name.replace(/([a-z0-9])([A-Z])/g, '$1_$2').toLowerCase();

/** `invoiceLine.unitPriceCents` stands as `invoice_line.unit_price_cents`. */
export class SnakeNaming extends DefaultNamingStrategy {
  override tableName(className: string, given: string | undefined): string {
    return given ?? snake(className);
  }
  override columnName(property: string, given: string | undefined): string {
    return given ?? snake(property);
  }
}
