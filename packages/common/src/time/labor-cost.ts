import { Decimal } from 'decimal.js';
import { roundHalfUp, type Cents } from '../money/cents.js';

/** What clocked time costs, half-up to the cent an entry. A meal break costs nothing (29 CFR 785.19: it is unpaid). */
export function laborCost(minutes: number, centsPerHour: Cents): Cents {
  return roundHalfUp(new Decimal(minutes).times(centsPerHour).div(60));
}
