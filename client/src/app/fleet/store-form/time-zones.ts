/** The zones of the United States, by what their names begin with in the IANA database. */
const near = /^(America|Pacific)\//;

/** Zones to choose from, those of the Americas and the Pacific first. */
export function timeZones(): readonly string[] {
  const all = Intl.supportedValuesOf('timeZone');
  return [...all.filter((zone) => near.test(zone)), ...all.filter((zone) => !near.test(zone))];
}
