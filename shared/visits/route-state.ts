export const routeStates = ['draft', 'published', 'changed'] as const;

/** Draft: told to nobody. Published: as told. Changed: differs from what was told last. */
export type RouteState = (typeof routeStates)[number];

/**
 * How a route stands against what its technician and stores were told.
 *
 * @param publishedVersion the version that was told; null when none was
 * @example routeState(4, 3) // 'changed'
 */
export function routeState(version: number, publishedVersion: number | null): RouteState {
  if (publishedVersion === null) return 'draft';
  return version === publishedVersion ? 'published' : 'changed';
}
