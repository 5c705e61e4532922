import type * as z from 'zod';

/**
 * What a field's problem is called where its schema has no words of its own: in plain English instead of the language of
 * types. Given to every parse as its error map; a schema's own message goes before it.
 */
export function plainMessage(issue: z.core.$ZodRawIssue): string | undefined {
  if (issue.code === 'invalid_type')
    return issue.input === undefined ? 'This is needed.' : TYPE_WORDS[issue.expected];
  if (issue.code === 'invalid_value') return 'Choose one of the offered values.';
  if (issue.code === 'invalid_union') return 'This does not have one of the forms it can have.';
  if (issue.code === 'too_small') return `This is less than the smallest allowed, ${String(issue.minimum)}.`;
  if (issue.code === 'too_big') return `This is more than the largest allowed, ${String(issue.maximum)}.`;
  return undefined;
}

const TYPE_WORDS: Record<string, string> = {
  string: 'Give a text.',
  number: 'Give a number.',
  int: 'Give a whole number.',
  boolean: 'Give yes or no.',
  array: 'Give a list.',
  object: 'Give a group of fields.',
  date: 'Give a date.',
};
