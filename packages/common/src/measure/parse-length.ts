import { Fraction } from 'fraction.js';
import { INCHES_PER_FOOT, MAX_LENGTH_MM, MM_PER_INCH } from './length.js';
import type { UnitSystem } from './unit-system.js';

/** What was typed, exactly; or what is wrong with it, as a sentence for the field. */
export type LengthReading = { millimeters: Fraction } | { problem: string };

const NUMBER = String.raw`\d+[- ]\d+/\d+|\d+/\d+|\d+\.?\d*|\.\d+`;
const FEET = String.raw`'|ft|foot|feet`;
const INCHES = String.raw`"|in|inch|inches`;
const FEET_AND_INCHES = new RegExp(`^(${NUMBER}) ?(?:${FEET})(?:[- ]?(${NUMBER}) ?(?:${INCHES})?)?$`);
const ONE_UNIT = new RegExp(`^(${NUMBER}) ?(${INCHES}|mm|cm|m)?$`);
const MAX_TYPED = 40;

/**
 * Reads a length as a maker types it: `23 5/8`, `23-5/8"`, `1' 11 5/8`, `600mm`, `60 cm`, `.75`, `23⅝″`. A bare number
 * is inches or millimeters, as the shop measures; after feet it is inches.
 */
export function parseLength(typed: string, system: UnitSystem): LengthReading {
  const text = plainText(typed);
  if (text.startsWith('-')) return { problem: 'A length cannot be below zero.' };
  const millimeters = text.length > MAX_TYPED ? null : (readFeet(text) ?? readOneUnit(text, system));
  if (millimeters === null) return notALength(system);
  if (millimeters === 'improper')
    return { problem: 'The fraction after a whole number must be less than one.' };
  if (millimeters.gt(MAX_LENGTH_MM)) return { problem: 'This length is too large.' };
  return { millimeters };
}

type Parsed = Fraction | 'improper' | null;

function readFeet(text: string): Parsed {
  const match = FEET_AND_INCHES.exec(text);
  if (!match) return null;
  const [feet, inches] = [
    readNumber(match[1]!),
    match[2] === undefined ? new Fraction(0) : readNumber(match[2]),
  ];
  if (!(feet instanceof Fraction)) return feet;
  if (!(inches instanceof Fraction)) return inches;
  return feet.mul(INCHES_PER_FOOT).add(inches).mul(MM_PER_INCH);
}

function readOneUnit(text: string, system: UnitSystem): Parsed {
  const match = ONE_UNIT.exec(text);
  if (!match) return null;
  const number = readNumber(match[1]!);
  return number instanceof Fraction ? number.mul(millimetersPer(match[2], system)) : number;
}

function millimetersPer(unit: string | undefined, system: UnitSystem): Fraction {
  switch (unit) {
    case 'mm':
      return new Fraction(1);
    case 'cm':
      return new Fraction(10);
    case 'm':
      return new Fraction(1000);
    case undefined:
      return system === 'inch' ? MM_PER_INCH : new Fraction(1);
    default:
      return MM_PER_INCH;
  }
}

/** `23 5/8`, `5/8`, `23.625`, `.75`; null when it divides by zero. */
function readNumber(text: string): Parsed {
  const [fraction = '', whole] = text.split(/[- ]/).reverse();
  const [numerator, denominator] = fraction.split('/');
  if (denominator === undefined) return new Fraction(`0${numerator}`);
  if (Number(denominator) === 0) return null;
  const part = new Fraction(`${numerator}/${denominator}`);
  if (whole === undefined) return part;
  return part.lt(1) ? part.add(whole) : 'improper';
}

/** One way to write each sign, so that the patterns above stay short. */
function plainText(typed: string): string {
  return typed
    .toLowerCase()
    .replaceAll(/[\u00bc-\u00be\u2150-\u215e]/g, (vulgar) => ` ${vulgar.normalize('NFKC')}`)
    .replaceAll('\u2044', '/')
    .replaceAll(/''|[\u2033\u201c\u201d]/g, '"')
    .replaceAll(/[\u2032\u2018\u2019]/g, "'")
    .replaceAll(/[\u2010-\u2015\u2212]/g, '-')
    .replaceAll(/\s+/g, ' ')
    .replaceAll(/ ?([-/]) ?/g, '$1')
    .trim();
}

function notALength(system: UnitSystem): LengthReading {
  return {
    problem:
      system === 'inch'
        ? 'Give a length, such as 23 5/8 or 600 mm.'
        : 'Give a length, such as 600 or 23 5/8".',
  };
}
