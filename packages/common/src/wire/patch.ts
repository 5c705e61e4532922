import * as z from 'zod';

type WithoutDefault<Field> =
  Field extends z.ZodDefault<infer Inner> ? Inner : Field extends z.ZodPrefault<infer Inner> ? Inner : Field;
type Patched<Shape extends z.ZodRawShape> = {
  [Key in keyof Shape]: z.ZodOptional<WithoutDefault<Shape[Key]> & z.core.SomeType>;
};

/**
 * The body of a PATCH over a slice's fields: each may be left out, and what is left out stays as it is.
 *
 * zod's own `partial()` keeps the defaults, so that a field left out would be emptied; here the defaults are taken off.
 */
export function patchSchema<Shape extends z.ZodRawShape>(fields: z.ZodObject<Shape>) {
  const shape = Object.fromEntries(
    Object.entries(fields.shape).map(([key, field]) => [key, z.optional(withoutDefault(field))]),
  );
  return z.strictObject(shape as unknown as Patched<Shape>);
}

function withoutDefault(field: z.core.SomeType): z.core.SomeType {
  return field instanceof z.ZodDefault || field instanceof z.ZodPrefault ? field.unwrap() : field;
}
