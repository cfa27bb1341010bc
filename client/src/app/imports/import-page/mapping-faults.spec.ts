import { columnLetter } from './column-letter';
import { mappingFaults } from './mapping-faults';

describe('mappingFaults', () => {
  it('names the fields that a kind cannot do without', () => {
    expect(mappingFaults('units', ['storeNumber', null]).missing).toEqual(['unitTag']);
    expect(mappingFaults('units', ['storeNumber', 'unitTag']).missing).toEqual([]);
  });

  it('names each doubled field once, and lets any number of columns be passed over', () => {
    const fields = ['storeNumber', 'city', 'city', 'city', null, null] as const;
    expect(mappingFaults('stores', fields).doubled).toEqual(['city']);
  });
});

describe('columnLetter', () => {
  it('counts as spreadsheets do', () => {
    expect([0, 25, 26, 51, 52, 701, 702].map(columnLetter)).toEqual([
      'A',
      'Z',
      'AA',
      'AZ',
      'BA',
      'ZZ',
      'AAA',
    ]);
  });
});
