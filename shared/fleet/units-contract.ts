import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { component, newComponent } from './components-contract';
import {
  byId,
  byVersion,
  date,
  fileFormat,
  fileReply,
  instant,
  line,
  name,
  pageOf,
  paging,
  searchOf,
  version,
} from './fleet-parts';
import { componentKinds, pumpFaces, unitKinds } from './fleet-words';

const unitFields = z.strictObject({
  storeId: z.uuid(),
  tag: name(40),
  kind: z.enum(unitKinds),
  vats: z.int().min(1).max(12),
  /** Oil that it holds, in pounds. */
  oilPounds: z.number().positive().max(9999).multipleOf(0.1).nullable(),
  model: line(80),
  installedOn: date.nullable(),
  /** Since when it has stood unused; its schedules rest until it is back. */
  outOfServiceSince: date.nullable(),
});

export const unitRow = z.strictObject({
  id: z.uuid(),
  tag: z.string(),
  kind: z.enum(unitKinds),
  vats: z.int(),
  oilPounds: z.number().nullable(),
  model: z.string(),
  installedOn: date.nullable(),
  outOfServiceSince: date.nullable(),
  retiredAt: instant.nullable(),
  storeId: z.uuid(),
  storeNumber: z.string(),
  storeName: z.string(),
  chainName: z.string(),
  regionName: z.string(),
  timeZone: z.string(),
  /** Of the pump now fitted. */
  pumpFace: z.enum(pumpFaces).nullable(),
  pumpInstalledOn: date.nullable(),
  motorInstalledOn: date.nullable(),
  lastInspectedAt: instant.nullable(),
  openFindings: z.int(),
});

export const unit = unitRow.extend({
  chainId: z.uuid(),
  regionId: z.uuid(),
  storeRetiredAt: instant.nullable(),
  version,
  /** Those fitted now and those that came off, newest first. */
  components: z.array(component),
  mayEdit: z.boolean(),
});

/** Something that happened to a unit or a part of it. */
export const lifeEvent = z.strictObject({
  id: z.string(),
  kind: z.enum(['installed', 'inspected', 'found', 'repaired', 'replaced']),
  at: instant,
  componentKind: z.enum(componentKinds).nullable(),
  /** Cause of a finding, repair or removal. */
  cause: z.string().nullable(),
  severity: z.string().nullable(),
  /** Procedure of an inspection, serial number of a part. */
  what: z.strictObject({ en: z.string(), es: z.string() }).nullable(),
  note: z.string(),
  person: z.string().nullable(),
  /** The task or finding it can be read in. */
  taskId: z.uuid().nullable(),
  findingId: z.uuid().nullable(),
});

const filters = {
  ...searchOf([
    'store',
    '-store',
    'tag',
    '-tag',
    'kind',
    '-kind',
    'model',
    '-model',
    'vats',
    '-vats',
    'installed',
    '-installed',
    'inspected',
    '-inspected',
    'openFindings',
    '-openFindings',
  ]),
  chain: z.uuid().optional(),
  region: z.uuid().optional(),
  store: z.uuid().optional(),
  kind: z.enum(unitKinds).optional(),
  face: z.enum(pumpFaces).optional(),
  /** Out of service or not. */
  service: z.enum(['in', 'out']).optional(),
};

export const listUnits = endpoint({
  method: 'GET',
  path: '/units',
  summary: 'Units in sight',
  access: 'fleet.read',
  query: z.strictObject({ ...filters, ...paging }),
  reply: pageOf(unitRow),
});

export const exportUnits = endpoint({
  method: 'GET',
  path: '/units/export',
  summary: 'The units of a list with store and parts, as a file that can be imported again',
  access: 'fleet.read',
  query: z.strictObject({ ...filters, ...fileFormat }),
  reply: fileReply,
});

export const readUnit = endpoint({
  method: 'GET',
  path: '/units/:id',
  summary: 'One unit with its parts',
  access: 'fleet.read',
  params: byId,
  reply: unit,
});

export const readUnitLife = endpoint({
  method: 'GET',
  path: '/units/:id/life',
  summary: 'What happened to a unit: fitted, inspected, found, repaired, replaced',
  access: 'fleet.read',
  params: byId,
  reply: z.strictObject({ events: z.array(lifeEvent), timeZone: z.string() }),
});

export const createUnit = endpoint({
  method: 'POST',
  path: '/units',
  summary: 'Add a unit, with its parts if they are known',
  access: 'fleet.edit',
  body: unitFields.extend({ id: z.uuid(), components: z.array(newComponent).max(12) }),
  reply: unit,
});

export const editUnit = endpoint({
  method: 'PATCH',
  path: '/units/:id',
  summary: 'Change a unit, or move it to another store',
  access: 'fleet.edit',
  params: byId,
  body: unitFields.extend({ version }),
  reply: unit,
});

export const retireUnit = endpoint({
  method: 'POST',
  path: '/units/:id/retire',
  summary: 'Take a unit out of use for good: its schedules end',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: unit,
});

export const restoreUnit = endpoint({
  method: 'POST',
  path: '/units/:id/restore',
  summary: 'Take a retired unit back into use',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: unit,
});

export const unitEndpoints = [
  listUnits,
  exportUnits,
  readUnit,
  readUnitLife,
  createUnit,
  editUnit,
  retireUnit,
  restoreUnit,
];
