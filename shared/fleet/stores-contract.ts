import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import {
  byId,
  byVersion,
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
import { storeHours } from './store-hours';

const position = z.strictObject({
  /** Degrees north, WGS 84. */
  latitude: z.number().min(-90).max(90),
  /** Degrees east, WGS 84. */
  longitude: z.number().min(-180).max(180),
});

/** Where an address lies, and how that was found. */
export const location = position.extend({
  positionFrom: z.enum(['coordinates', 'postal-code']),
  timeZone: z.string(),
});

const storeFields = z.strictObject({
  chainId: z.uuid(),
  regionId: z.uuid(),
  number: name(40),
  name: name(120),
  addressLine: line(200),
  city: line(100),
  usState: line(40),
  postalCode: line(20),
  /** Without one it comes from the ZIP code. */
  position: position.nullable(),
  /** An IANA zone; without one it comes from the position. */
  timeZone: line(60).nullable(),
  phone: line(40),
  /** How to get in and whom to ask. */
  accessNote: line(1000),
  hours: storeHours,
});

export const storeRow = z.strictObject({
  id: z.uuid(),
  number: z.string(),
  name: z.string(),
  chainId: z.uuid(),
  chainName: z.string(),
  regionId: z.uuid(),
  regionName: z.string(),
  city: z.string(),
  usState: z.string(),
  postalCode: z.string(),
  timeZone: z.string(),
  /** Live units. */
  units: z.int(),
  /** Findings not settled yet. */
  openFindings: z.int(),
  retiredAt: instant.nullable(),
});

export const store = storeRow.extend({
  version,
  addressLine: z.string(),
  ...location.shape,
  /** What the position alone would give. */
  timeZoneOfPosition: z.string(),
  phone: z.string(),
  accessNote: z.string(),
  hours: storeHours,
  mayEdit: z.boolean(),
});

const filters = {
  ...searchOf([
    'number',
    '-number',
    'name',
    '-name',
    'chain',
    '-chain',
    'region',
    '-region',
    'city',
    '-city',
    'units',
    '-units',
    'openFindings',
    '-openFindings',
  ]),
  chain: z.uuid().optional(),
  region: z.uuid().optional(),
  usState: z.string().trim().max(40).optional(),
};

export const listStores = endpoint({
  method: 'GET',
  path: '/stores',
  summary: 'Stores in sight',
  access: 'fleet.read',
  query: z.strictObject({ ...filters, ...paging }),
  reply: pageOf(storeRow),
});

export const exportStores = endpoint({
  method: 'GET',
  path: '/stores/export',
  summary: 'The stores of a list, as a file',
  access: 'fleet.read',
  query: z.strictObject({ ...filters, ...fileFormat }),
  reply: fileReply,
});

export const locateStore = endpoint({
  method: 'GET',
  path: '/stores/locate',
  summary: 'Where a ZIP code or a position lies, and its time zone',
  access: 'fleet.edit',
  query: z.strictObject({
    postalCode: z.string().trim().max(20).optional(),
    latitude: z.coerce.number().min(-90).max(90).optional(),
    longitude: z.coerce.number().min(-180).max(180).optional(),
  }),
  reply: z.strictObject({
    /** Null when nothing is known of it. */
    place: location.extend({ city: z.string(), usState: z.string() }).nullable(),
  }),
});

export const readStore = endpoint({
  method: 'GET',
  path: '/stores/:id',
  summary: 'One store',
  access: 'fleet.read',
  params: byId,
  reply: store,
});

export const createStore = endpoint({
  method: 'POST',
  path: '/stores',
  summary: 'Add a store',
  access: 'fleet.edit',
  body: storeFields.extend({ id: z.uuid() }),
  reply: store,
});

export const editStore = endpoint({
  method: 'PATCH',
  path: '/stores/:id',
  summary: 'Change a store',
  access: 'fleet.edit',
  params: byId,
  body: storeFields.extend({ version }),
  reply: store,
});

export const retireStore = endpoint({
  method: 'POST',
  path: '/stores/:id/retire',
  summary: 'Take a store out of use: its schedules end',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: store,
});

export const restoreStore = endpoint({
  method: 'POST',
  path: '/stores/:id/restore',
  summary: 'Take a retired store back into use',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: store,
});

export const storeEndpoints = [
  listStores,
  exportStores,
  locateStore,
  readStore,
  createStore,
  editStore,
  retireStore,
  restoreStore,
];
