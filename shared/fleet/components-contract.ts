import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { causes } from '../findings/cause';
import {
  byId,
  byVersion,
  date,
  fileFormat,
  fileReply,
  line,
  pageOf,
  paging,
  searchOf,
  version,
} from './fleet-parts';
import { componentKinds, pumpFaces, removalReasons } from './fleet-words';
import { nameplate } from './nameplate';

/** Why a part came off: a cause as findings have it, or a reason that is no fault. */
export const removalCauses = [...causes, ...removalReasons] as const;
export type RemovalCause = (typeof removalCauses)[number];

/** What is known of a part as it is fitted. */
export const componentFields = z.strictObject({
  serialNumber: line(80),
  model: line(80),
  nameplate,
  /** Pumps only. */
  pumpFace: z.enum(pumpFaces).nullable(),
  installedOn: date,
});

export const newComponent = componentFields.extend({
  id: z.uuid(),
  kind: z.enum(componentKinds),
});

export const component = newComponent.extend({
  unitId: z.uuid(),
  removedOn: date.nullable(),
  removalCause: z.string().nullable(),
  version,
});

export const componentRow = component.extend({
  unitTag: z.string(),
  storeId: z.uuid(),
  storeNumber: z.string(),
  storeName: z.string(),
});

const filters = {
  ...searchOf([
    'store',
    '-store',
    'kind',
    '-kind',
    'serial',
    '-serial',
    'model',
    '-model',
    'installed',
    '-installed',
    'removed',
    '-removed',
  ]),
  chain: z.uuid().optional(),
  region: z.uuid().optional(),
  store: z.uuid().optional(),
  unit: z.uuid().optional(),
  kind: z.enum(componentKinds).optional(),
  face: z.enum(pumpFaces).optional(),
};

export const listComponents = endpoint({
  method: 'GET',
  path: '/components',
  summary: 'Parts in sight; those that came off count as retired',
  access: 'fleet.read',
  query: z.strictObject({ ...filters, ...paging }),
  reply: pageOf(componentRow),
});

export const exportComponents = endpoint({
  method: 'GET',
  path: '/components/export',
  summary: 'The parts of a list, as a file',
  access: 'fleet.read',
  query: z.strictObject({ ...filters, ...fileFormat }),
  reply: fileReply,
});

export const installComponent = endpoint({
  method: 'POST',
  path: '/units/:id/components',
  summary: 'Fit a part that the unit lacks',
  access: 'fleet.edit',
  params: byId,
  body: newComponent,
  reply: component,
});

export const editComponent = endpoint({
  method: 'PATCH',
  path: '/components/:id',
  summary: 'Correct what is written down of a part',
  access: 'fleet.edit',
  params: byId,
  body: componentFields.extend({ version }),
  reply: component,
});

export const replaceComponent = endpoint({
  method: 'POST',
  path: '/components/:id/replace',
  summary: 'Take a part off, with its cause, and fit a new one on the same day',
  access: 'fleet.edit',
  params: byId,
  body: z.strictObject({
    version,
    removedOn: date,
    cause: z.enum(removalCauses),
    /** The new part; fitted on the day the old one came off. */
    fitted: componentFields.omit({ installedOn: true }).extend({ id: z.uuid() }),
  }),
  reply: component,
});

export const removeComponent = endpoint({
  method: 'POST',
  path: '/components/:id/remove',
  summary: 'Take a part off without a new one',
  access: 'fleet.edit',
  params: byId,
  body: z.strictObject({ version, removedOn: date, cause: z.enum(removalCauses) }),
  reply: component,
});

export const undoRemoval = endpoint({
  method: 'POST',
  path: '/components/:id/undo-removal',
  summary: 'Say that a part never came off',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: component,
});

export const componentEndpoints = [
  listComponents,
  exportComponents,
  installComponent,
  editComponent,
  replaceComponent,
  removeComponent,
  undoRemoval,
];
