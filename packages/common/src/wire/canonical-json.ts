/**
 * One and the same text for equal plain data, for hashing: keys sorted by UTF-16 code units, no spaces, as RFC 8785
 * (JSON Canonicalization Scheme) says. Keys whose value is undefined are left out.
 *
 * @throws RangeError on a number that is not finite
 */
export function canonicalJson(value: unknown): string {
  if (typeof value === 'number' && !Number.isFinite(value)) throw new RangeError('JSON has no such number');
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
    .map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`);
  return `{${members.join(',')}}`;
}
