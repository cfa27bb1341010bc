import { componentEndpoints } from './components-contract';
import { groupEndpoints } from './groups-contract';
import { storeEndpoints } from './stores-contract';
import { unitEndpoints } from './units-contract';

export * from './components-contract';
export * from './groups-contract';
export * from './stores-contract';
export * from './units-contract';

/** Everything the server can be asked for about the fleet. */
export const fleetEndpoints = [
  ...groupEndpoints,
  ...storeEndpoints,
  ...unitEndpoints,
  ...componentEndpoints,
];
