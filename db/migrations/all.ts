import { createOrganisations } from './20261201090000-create-organisations';
import { createFleet } from './20261201090100-create-fleet';
import { createPeople } from './20261201090200-create-people';
import { createSessions } from './20261201090300-create-sessions';
import { createProcedures } from './20261201090400-create-procedures';
import { createProgrammes } from './20261201090500-create-programmes';
import { createTasks } from './20261201090600-create-tasks';
import { createInspections } from './20261201090700-create-inspections';
import { createVisits } from './20261201090800-create-visits';
import { createMail } from './20261201090900-create-mail';
import { createCompliance } from './20261201091000-create-compliance';
import { createAudit } from './20261201091100-create-audit';
import { createWorkRecords } from './20261201091200-create-work-records';
import { createRateLimits } from './20261201091300-create-rate-limits';
import { createImports } from './20261201091400-create-imports';
import type { Migration } from './migration';

/** Every migration in order. A list, as file patterns do not survive bundling. */
export const migrations: readonly Migration[] = [
  createOrganisations,
  createFleet,
  createPeople,
  createSessions,
  createProcedures,
  createProgrammes,
  createTasks,
  createInspections,
  createVisits,
  createMail,
  createCompliance,
  createAudit,
  createWorkRecords,
  createRateLimits,
  createImports,
];
