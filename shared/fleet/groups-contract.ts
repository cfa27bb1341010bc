import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import {
  byId,
  byVersion,
  fileFormat,
  fileReply,
  instant,
  name,
  pageOf,
  paging,
  searchOf,
  version,
} from './fleet-parts';

const fields = z.strictObject({ name: name(120) });

/** A chain or a region with how much stands in it. */
export const group = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  retiredAt: instant.nullable(),
  version,
  /** Live stores and units. */
  stores: z.int(),
  units: z.int(),
  mayEdit: z.boolean(),
});

const filters = searchOf(['name', '-name', 'stores', '-stores', 'units', '-units']);
const query = z.strictObject({ ...filters, ...paging });
const fileQuery = z.strictObject({ ...filters, ...fileFormat });

export const listChains = endpoint({
  method: 'GET',
  path: '/chains',
  summary: 'Chains in sight, with how many stores and units they have',
  access: 'fleet.read',
  query,
  reply: pageOf(group),
});

export const exportChains = endpoint({
  method: 'GET',
  path: '/chains/export',
  summary: 'The chains of a list, as a file',
  access: 'fleet.read',
  query: fileQuery,
  reply: fileReply,
});

export const createChain = endpoint({
  method: 'POST',
  path: '/chains',
  summary: 'Add a chain',
  access: 'fleet.edit',
  body: fields.extend({ id: z.uuid() }),
  reply: group,
});

export const editChain = endpoint({
  method: 'PATCH',
  path: '/chains/:id',
  summary: 'Rename a chain',
  access: 'fleet.edit',
  params: byId,
  body: fields.extend({ version }),
  reply: group,
});

export const retireChain = endpoint({
  method: 'POST',
  path: '/chains/:id/retire',
  summary: 'Take a chain without live stores out of use',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: group,
});

export const restoreChain = endpoint({
  method: 'POST',
  path: '/chains/:id/restore',
  summary: 'Take a retired chain back into use',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: group,
});

export const listRegions = endpoint({
  method: 'GET',
  path: '/regions',
  summary: 'Regions in sight, with how many stores and units they have',
  access: 'fleet.read',
  query,
  reply: pageOf(group),
});

export const exportRegions = endpoint({
  method: 'GET',
  path: '/regions/export',
  summary: 'The regions of a list, as a file',
  access: 'fleet.read',
  query: fileQuery,
  reply: fileReply,
});

export const createRegion = endpoint({
  method: 'POST',
  path: '/regions',
  summary: 'Add a region',
  access: 'fleet.edit',
  body: fields.extend({ id: z.uuid() }),
  reply: group,
});

export const editRegion = endpoint({
  method: 'PATCH',
  path: '/regions/:id',
  summary: 'Rename a region',
  access: 'fleet.edit',
  params: byId,
  body: fields.extend({ version }),
  reply: group,
});

export const retireRegion = endpoint({
  method: 'POST',
  path: '/regions/:id/retire',
  summary: 'Take a region without live stores out of use',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: group,
});

export const restoreRegion = endpoint({
  method: 'POST',
  path: '/regions/:id/restore',
  summary: 'Take a retired region back into use',
  access: 'fleet.edit',
  params: byId,
  body: byVersion,
  reply: group,
});

export const groupEndpoints = [
  listChains,
  exportChains,
  createChain,
  editChain,
  retireChain,
  restoreChain,
  listRegions,
  exportRegions,
  createRegion,
  editRegion,
  retireRegion,
  restoreRegion,
];
