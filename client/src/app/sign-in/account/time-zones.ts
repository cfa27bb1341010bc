/** Zones of the places this is used in most, first in the list. */
const NEAR = [
  'America/New_York',
  'America/Chicago',
  'America/Denver',
  'America/Phoenix',
  'America/Los_Angeles',
  'America/Anchorage',
  'Pacific/Honolulu',
  'America/Puerto_Rico',
];

/** Whether the browser knows this IANA zone. */
export function isTimeZone(name: string): boolean {
  if (!name) return false;
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}

/** Up to thirty zones whose name holds the typed words; the near ones where nothing narrows it. */
export function matchingZones(typed: string): readonly string[] {
  const words = typed.trim().toLowerCase().replaceAll(' ', '_');
  const all = [...NEAR, ...Intl.supportedValuesOf('timeZone').filter((z) => !NEAR.includes(z))];
  if (words === '' || isTimeZone(typed.trim())) return NEAR;
  return all.filter((zone) => zone.toLowerCase().includes(words)).slice(0, 30);
}
