/** Printed at start and used by the browser journeys. The password is for the demo world alone. */
const password = 'crumbs out, paper in';

/** @type {readonly {name: string, email: string, role: string, password: string}[]} */
export const demoSignIns = [
  ['Marguerite Hale', 'marguerite.hale', 'regional facility manager'],
  ['Walt Brennan', 'walt.brennan', 'technician'],
  ['Rosa Quintero', 'store0101', 'store manager'],
  ['Colin Avery', 'colin.avery', 'account owner'],
  ['Tobias Okafor', 'tobias.okafor', 'trainer'],
  ['Ada Lindqvist', 'ada.lindqvist', 'administrator'],
].map(([name, local, role]) => ({ name, email: `${local}@lanternline.example`, role, password }));

export default demoSignIns;
