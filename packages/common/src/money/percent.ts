export type PercentReading = { rate: string } | { problem: string };

/** A rate as it is kept, a decimal fraction in text, as a person writes it: `"0.0825"` is `8.25`. Exact. */
export function rateToPercent(rate: string): string {
  const [whole = '0', decimals = ''] = rate.split('.');
  const shifted = `${whole}${decimals.padEnd(2, '0').slice(0, 2)}`.replace(/^0+(?=\d)/, '');
  const rest = decimals.slice(2).replace(/0+$/, '');
  return rest === '' ? shifted : `${shifted}.${rest}`;
}

/** Reads a percent that a person typed, `8.25` or `8.25 %`, into the rate that is kept: `"0.0825"`. Exact. */
export function percentToRate(text: string): PercentReading {
  const match = /^(\d{1,3})(?:\.(\d{1,4}))?$/.exec(text.trim().replace(/\s*%$/, ''));
  if (!match) return { problem: 'Give a percent, such as 8.25.' };
  const digits = (match[1] ?? '').padStart(3, '0');
  const whole = digits.slice(0, -2).replace(/^0+(?=\d)/, '');
  const decimals = `${digits.slice(-2)}${match[2] ?? ''}`.replace(/0+$/, '');
  return { rate: decimals === '' ? whole : `${whole}.${decimals}` };
}
