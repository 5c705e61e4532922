import * as z from 'zod';

/** What money is spent on: the kind of an estimate's line, and the row a job's cost is compared in. */
export const COST_CATEGORIES = [
  'material',
  'hardware',
  'labor',
  'finishing',
  'subcontract',
  'delivery',
  'install',
  'other',
] as const;
export const costCategorySchema = z.enum(COST_CATEGORIES, { error: 'Choose what kind of cost this is.' });
export type CostCategory = z.infer<typeof costCategorySchema>;

export const COST_CATEGORY_NAMES: Record<CostCategory, string> = {
  material: 'Material',
  hardware: 'Hardware',
  labor: 'Shop labor',
  finishing: 'Finishing',
  subcontract: 'Subcontract',
  delivery: 'Delivery',
  install: 'Install',
  other: 'Other',
};

/** The categories that clocked time can fall in; an operation has one of them. */
export const TIME_CATEGORIES = ['labor', 'finishing', 'delivery', 'install'] as const;
export const timeCategorySchema = z.enum(TIME_CATEGORIES);
export type TimeCategory = z.infer<typeof timeCategorySchema>;
