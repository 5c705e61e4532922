const BROWSERS: readonly [RegExp, string][] = [
  [/Edg\//, 'Edge'],
  [/Firefox\//, 'Firefox'],
  [/Chrome\//, 'Chrome'],
  [/Safari\//, 'Safari'],
];
const SYSTEMS: readonly [RegExp, string][] = [
  [/iPhone/, 'iPhone'],
  [/iPad/, 'iPad'],
  [/Android/, 'Android'],
  [/Windows/, 'Windows'],
  [/Mac OS/, 'Mac'],
  [/Linux/, 'Linux'],
];

/** A browser's own long name in two words: `Firefox on Windows`. */
export function deviceName(userAgent: string): string {
  const name = (known: readonly [RegExp, string][]) => known.find(([mark]) => mark.test(userAgent))?.[1];
  const [browser, system] = [name(BROWSERS), name(SYSTEMS)];
  if (!browser && !system) return 'Unknown browser';
  return [browser ?? 'Browser', system].filter(Boolean).join(' on ');
}
