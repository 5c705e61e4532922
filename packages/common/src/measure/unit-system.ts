import * as z from 'zod';

/** What a bare number means in a length field, and how a length is echoed. Inside, every length is millimeters. */
export const UNIT_SYSTEMS = ['inch', 'metric'] as const;
export const unitSystemSchema = z.enum(UNIT_SYSTEMS, { error: 'Choose inch or metric.' });
export type UnitSystem = z.infer<typeof unitSystemSchema>;
