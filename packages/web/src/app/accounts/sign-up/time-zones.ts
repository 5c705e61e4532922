/** Where most shops are, under the names people use for their time. */
export const HOME_ZONES: readonly { zone: string; name: string }[] = [
  { zone: 'America/New_York', name: 'Eastern' },
  { zone: 'America/Chicago', name: 'Central' },
  { zone: 'America/Denver', name: 'Mountain' },
  { zone: 'America/Phoenix', name: 'Mountain, without daylight saving (Arizona)' },
  { zone: 'America/Los_Angeles', name: 'Pacific' },
  { zone: 'America/Anchorage', name: 'Alaska' },
  { zone: 'Pacific/Honolulu', name: 'Hawaii' },
];

/** All the others that this browser knows. */
export function otherZones(): string[] {
  const home = new Set(HOME_ZONES.map(({ zone }) => zone));
  return Intl.supportedValuesOf('timeZone').filter((zone) => !home.has(zone));
}

/** The zone this browser is in, if it is a place; Eastern for one that only knows universal time. */
export function likelyZone(zone = new Intl.DateTimeFormat().resolvedOptions().timeZone): string {
  const offered = [...HOME_ZONES.map((home) => home.zone), ...otherZones()];
  return offered.includes(zone) ? zone : 'America/New_York';
}
