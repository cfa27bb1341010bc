/** A time zone in which the next dates can be looked at, with its name in the reader's language. */
export interface PreviewZone {
  readonly id: string;
  readonly name: string;
}

/** One zone for each clock of the fifty states (IANA Time Zone Database, file `northamerica`). */
const zones = [
  'America/New_York',
  'America/Chicago',
  'America/Denver',
  'America/Phoenix',
  'America/Los_Angeles',
  'America/Anchorage',
  'Pacific/Honolulu',
];

/** The zones to choose from, the reader's own first where it is another one. */
export function previewZones(own: string, locale: string): readonly PreviewZone[] {
  return [...new Set([own, ...zones])].map((id) => ({ id, name: zoneName(id, locale) }));
}

/**
 * "Mountain Standard Time (Phoenix)": the zone's own name, and its city, as two zones can share a
 * name for half of the year.
 */
function zoneName(id: string, locale: string): string {
  const parts = new Intl.DateTimeFormat(locale, {
    timeZone: id,
    timeZoneName: 'longGeneric',
  }).formatToParts(0);
  const name = parts.find(({ type }) => type === 'timeZoneName')?.value ?? id;
  const city = (id.split('/').at(-1) ?? id).replaceAll('_', ' ');
  return name.includes(city) ? name : `${name} (${city})`;
}
