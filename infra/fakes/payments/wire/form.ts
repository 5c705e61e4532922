import { invalid } from './error.js';

/** A parameter tree as the wire carries it: leaves are text, lists are maps keyed by position. */
export type FormMap = Map<string, FormNode>;
export type FormNode = string | FormMap;

const MAX_DEPTH = 8;
const NAME = /^([^[\]]+)((?:\[[^[\]]*\])*)$/;

/** `a[b][0]` gives `a`, `b`, `0`. */
function segmentsOf(name: string): string[] {
  const match = NAME.exec(name);
  if (match === null) throw invalid(`Invalid parameter name: ${name}`, name);
  const inner = [...(match[2] ?? '').matchAll(/\[([^[\]]*)\]/g)].map((part) => part[1] ?? '');
  if (inner.length >= MAX_DEPTH) throw invalid(`Parameter nested too deeply: ${name}`, name);
  return [match[1] ?? '', ...inner];
}

function branch(map: FormMap, key: string, name: string): FormMap {
  const held = map.get(key);
  if (typeof held === 'string') throw invalid(`Invalid object: ${name}`, name);
  if (held !== undefined) return held;
  const fresh: FormMap = new Map();
  map.set(key, fresh);
  return fresh;
}

function place(root: FormMap, name: string, value: string): void {
  let map = root;
  const segments = segmentsOf(name);
  const last = segments.pop() ?? '';
  for (const segment of segments) map = branch(map, segment === '' ? String(map.size) : segment, name);
  const key = last === '' ? String(map.size) : last;
  if (map.has(key)) throw invalid(`Parameter given twice: ${name}`, name);
  map.set(key, value);
}

/**
 * Reads `application/x-www-form-urlencoded` text with bracketed names.
 * Errors: 400 for a malformed name, a name given twice, or one that is both text and object.
 */
export function decodeForm(text: string): FormMap {
  const root: FormMap = new Map();
  for (const [name, value] of new URLSearchParams(text)) place(root, name, value);
  return root;
}
