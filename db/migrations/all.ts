import { createFleet } from './20261201090100-create-fleet';
import { createOrganisations } from './20261201090000-create-organisations';
import { createPeople } from './20261201090200-create-people';
import type { Migration } from './migration';

/** Every migration in order. A list, as file patterns do not survive bundling. */
export const migrations: readonly Migration[] = [createOrganisations, createFleet, createPeople];
