import type { Request } from 'express';

/** One text field of a posted form, empty when it is absent or sent twice. */
export function fieldOf(request: Request, name: string): string {
  const body: unknown = request.body;
  if (typeof body !== 'string') return '';
  const values = new URLSearchParams(body).getAll(name);
  return values.length === 1 ? (values[0] ?? '') : '';
}
