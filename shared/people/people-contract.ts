import * as z from 'zod';
import { roles, scopeKinds } from '../access/role';
import { endpoint } from '../contract/endpoint';
import { fileFormat, fileReply } from '../exports/export-format';
import { pageOf, paging, version } from '../fleet/fleet-parts';
import { localeField, personName, timeZoneField } from '../sign-in/account-contract';
import { standings } from './standing';

const params = z.strictObject({ id: z.uuid() });

/** A role over a scope, as it is given. */
export const grantField = z.strictObject({
  role: z.enum(roles),
  scopeKind: z.enum(scopeKinds),
  scopeId: z.uuid(),
});

const grantFields = z.array(grantField).min(1, 'Choose at least one role.').max(50);

/** A ZIP code, with or without its four more digits. */
const postalCode = z
  .string()
  .trim()
  .regex(/^\d{5}(-?\d{4})?$/, 'Give a ZIP code of five digits.');

const grant = grantField.extend({ scopeName: z.string() });

export const personRow = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  email: z.string().nullable(),
  locale: localeField,
  timeZone: z.string(),
  standing: z.enum(standings),
  roles: z.array(grant),
  /** Where a technician's days begin, as far as it is known. */
  homePostalCode: z.string().nullable(),
  homeKnown: z.boolean(),
  /** When the person last used the product, as long as a session of theirs lives. */
  lastSeenAt: z.iso.datetime().nullable(),
});

export const person = personRow.extend({
  version,
  createdAt: z.iso.datetime(),
  /** Until when the latest invitation can be accepted; null when none waits. */
  invitedUntil: z.iso.datetime().nullable(),
  home: z
    .strictObject({ latitude: z.number(), longitude: z.number(), city: z.string() })
    .nullable(),
  mayEdit: z.boolean(),
  /** False for oneself and for the last administrator. */
  mayDeactivate: z.boolean(),
});

const filters = {
  q: z.string().trim().max(100).default(''),
  role: z.enum(roles).optional(),
  region: z.uuid().optional(),
  chain: z.uuid().optional(),
  standing: z.enum([...standings, 'all', 'present']).default('present'),
  sort: z.enum(['name', '-name', 'email', '-email', 'lastSeenAt', '-lastSeenAt']).default('name'),
};

export const listPeople = endpoint({
  method: 'GET',
  path: '/people',
  summary: 'People in sight with their roles',
  access: 'people.read',
  query: z.strictObject({ ...filters, ...paging }),
  reply: pageOf(personRow),
});

export const exportPeople = endpoint({
  method: 'GET',
  path: '/people/export',
  summary: 'The people of a list, one line for each role, as a file',
  access: 'people.read',
  query: z.strictObject({ ...filters, ...fileFormat }),
  reply: fileReply,
});

export const readPerson = endpoint({
  method: 'GET',
  path: '/people/:id',
  summary: 'One person',
  access: 'people.read',
  params,
  reply: person,
});

export const invitePerson = endpoint({
  method: 'POST',
  path: '/people',
  summary: 'Invite somebody by a letter, with the roles they will hold',
  access: 'people.edit',
  body: z.strictObject({
    id: z.uuid(),
    name: personName,
    email: z
      .string()
      .trim()
      .toLowerCase()
      .max(254)
      .pipe(z.email('Give an e-mail address, such as name@example.com.')),
    /** The language of the letter and of the pages that it leads to. */
    locale: localeField,
    timeZone: timeZoneField,
    homePostalCode: postalCode.nullable(),
    roles: grantFields,
  }),
  reply: person,
});

export const inviteAgain = endpoint({
  method: 'POST',
  path: '/people/:id/invitation',
  summary: 'Write another invitation; the earlier link works no more',
  access: 'people.edit',
  params,
  reply: person,
});

export const editPerson = endpoint({
  method: 'PATCH',
  path: '/people/:id',
  summary: 'Change name, language, time zone or home place',
  access: 'people.edit',
  params,
  body: z.strictObject({
    version,
    name: personName,
    locale: localeField,
    timeZone: timeZoneField,
    /** Null forgets the home place. */
    homePostalCode: postalCode.nullable(),
  }),
  reply: person,
});

export const editRoles = endpoint({
  method: 'PUT',
  path: '/people/:id/roles',
  summary: 'Say which roles somebody holds and where',
  access: 'people.edit',
  params,
  body: z.strictObject({ version, roles: grantFields }),
  reply: person,
});

export const deactivatePerson = endpoint({
  method: 'POST',
  path: '/people/:id/deactivate',
  summary: 'Let somebody in no more: their sessions and links end at once',
  access: 'people.edit',
  params,
  body: z.strictObject({ version }),
  reply: person,
});

export const activatePerson = endpoint({
  method: 'POST',
  path: '/people/:id/activate',
  summary: 'Let somebody in again',
  access: 'people.edit',
  params,
  body: z.strictObject({ version }),
  reply: person,
});

export const peopleEndpoints = [
  listPeople,
  exportPeople,
  readPerson,
  invitePerson,
  inviteAgain,
  editPerson,
  editRoles,
  deactivatePerson,
  activatePerson,
];
