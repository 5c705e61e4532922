import * as z from 'zod';
import { ROLES } from '../access/roles.js';
import { MAX_CENTS } from '../money/cents.js';

/** The building blocks of every contract, with the bounds and the plain message of each kind of field. */

export const idSchema = z.uuid({ error: 'This is not an id.' });
export const versionSchema = z.int().positive();
export const instantSchema = z.iso.datetime({ error: 'Give a date and time in UTC.' });
export const dateSchema = z.iso.date({ error: 'Give a date as YYYY-MM-DD.' });

/** One line of text: trimmed, no line breaks or control characters. */
export function lineSchema(max: number, label = 'This') {
  return z
    .string()
    .trim()
    .min(1, `${label} cannot be empty.`)
    .max(max, `${label} can have at most ${max} characters.`)
    .regex(/^[^\p{Cc}]*$/u, `${label} cannot have line breaks or control characters.`);
}

/** One line that may be left empty; empty is stored as an empty text, never as null. */
export function optionalLineSchema(max: number, label = 'This') {
  return z
    .string()
    .trim()
    .max(max, `${label} can have at most ${max} characters.`)
    .regex(/^[^\p{Cc}]*$/u, `${label} cannot have line breaks or control characters.`)
    .default('');
}

/** Several lines of text, possibly empty. */
export function notesSchema(max = 4000) {
  return z
    .string()
    .trim()
    .max(max, `This can have at most ${max} characters.`)
    .regex(/^(?:[^\p{Cc}]|[\n\r\t])*$/u, 'This has characters that cannot be kept.')
    .default('');
}

/** Several lines of text that somebody has to write. */
export function paragraphSchema(max: number, label = 'This') {
  return z
    .string()
    .trim()
    .min(1, `${label} cannot be empty.`)
    .max(max, `${label} can have at most ${max} characters.`)
    .regex(/^(?:[^\p{Cc}]|[\n\r\t])*$/u, `${label} has characters that cannot be kept.`);
}

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'An e-mail address can have at most 254 characters.')
  .pipe(z.email({ error: 'This is not an e-mail address.' }));

export const centsSchema = z
  .int('Give an amount.')
  .min(-MAX_CENTS, 'This amount is too large.')
  .max(MAX_CENTS, 'This amount is too large.');
export const positiveCentsSchema = centsSchema.min(1, 'Give an amount above zero.');
export const nonNegativeCentsSchema = centsSchema.min(0, 'An amount cannot be below zero.');

/** An exact decimal in text with at most `scale` places: `decimalSchema(3)` takes `"12.125"`. */
export function decimalSchema(scale: number, { min = 0, max = 1_000_000 } = {}) {
  return z
    .string()
    .trim()
    .regex(new RegExp(`^-?\\d{1,9}(\\.\\d{1,${scale}})?$`), `Give a number with at most ${scale} decimals.`)
    .refine((text) => Number(text) >= min && Number(text) <= max, `Give a number from ${min} to ${max}.`);
}

/** A rate as a decimal fraction in text: `"0.0825"` for 8.25 %. */
export const rateSchema = decimalSchema(6, { min: 0, max: 1 });

export const roleSchema = z.enum(ROLES, { error: 'Choose a role.' });

/** The secret part of a link that was mailed to somebody. */
export const tokenSchema = z
  .string()
  .regex(/^[A-Za-z0-9_-]{20,200}$/, 'This link is not complete. Open it from the e-mail again.');

/** The ISO 4217 code of the shop's one currency. */
export const currencySchema = z.string().regex(/^[A-Z]{3}$/, 'Give a currency as three letters.');

/** An answer that only says where to send the browser next: a page of the payment provider. */
export const redirectSchema = z.object({ url: z.url() });
export type Redirect = z.infer<typeof redirectSchema>;

/** The body of a command that needs nothing but its address. */
export const emptyBodySchema = z.strictObject({});
