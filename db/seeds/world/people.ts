import type { Role } from '@shared/access/role';
import { chains, regions } from './places';

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  /** Name of the chain or region; none for the whole organisation. */
  readonly over?: string;
  readonly locale?: 'en' | 'es';
  readonly homePostalCode?: string;
}

const domain = 'lanternline.example';

const staff = (name: string, role: Role, more: Partial<DemoPerson> = {}): DemoPerson => ({
  name,
  role,
  email: `${name
    .toLowerCase()
    .normalize('NFD')
    .replace(/[^a-z ]/g, '')
    .replaceAll(' ', '.')}@${domain}`,
  ...more,
});

const [ohio, prairie, saguaro] = regions;
const [peck, tidewater, curly] = chains;

/** Everybody but the store managers, of whom each store has one. */
export const people: readonly DemoPerson[] = [
  staff('Ada Lindqvist', 'administrator'),
  staff('Tobias Okafor', 'trainer'),
  staff('Marguerite Hale', 'regional-facility-manager', { over: ohio }),
  staff('Desmond Pruitt', 'regional-facility-manager', { over: prairie }),
  staff('Inés Carranza', 'regional-facility-manager', { over: saguaro, locale: 'es' }),
  staff('Walt Brennan', 'technician', { over: ohio, homePostalCode: '43085' }),
  staff('Keisha Monroe', 'technician', { over: ohio, homePostalCode: '45011' }),
  staff('Pete Sorensen', 'technician', { over: prairie, homePostalCode: '53511' }),
  staff('Lena Voss', 'technician', { over: prairie, homePostalCode: '50010' }),
  staff('Rafael Ibarra', 'technician', { over: saguaro, homePostalCode: '85283', locale: 'es' }),
  staff('June Tsosie', 'technician', { over: saguaro, homePostalCode: '85710' }),
  staff('Colin Avery', 'account-owner', { over: peck }),
  staff('Priya Raman', 'account-owner', { over: tidewater }),
  staff('Gus Hendry', 'account-owner', { over: curly }),
];

const firstNames = [
  'Rosa',
  'Marcus',
  'Dana',
  'Luis',
  'Tanya',
  'Felix',
  'Amber',
  'Jorge',
  'Shauna',
  'Victor',
  'Elena',
  'Brett',
  'Carmen',
  'Owen',
  'Yolanda',
] as const;
const lastNames = [
  'Quintero',
  'Baxter',
  'Nguyen',
  'Delgado',
  'Foster',
  'Whitaker',
  'Salas',
  'Meyer',
  'Castillo',
  'Rowe',
  'Becker',
] as const;

/** The manager of the nth store: every third one reads Spanish. */
export function storeManager(index: number, storeNumber: string): DemoPerson {
  const name = `${firstNames[index % firstNames.length]} ${lastNames[index % lastNames.length]}`;
  return {
    name,
    role: 'store-manager',
    email: `store${storeNumber}@${domain}`,
    locale: index % 3 === 2 ? 'es' : 'en',
  };
}
