import { apiQuery, apiUrl } from './api-url';

describe('apiUrl', () => {
  it('fills parameters and encodes them', () => {
    expect(apiUrl('/stores/:id/units/:unitId', { id: 'a/b', unitId: 7 })).toBe(
      '/api/v1/stores/a%2Fb/units/7',
    );
  });

  it('refuses a path whose parameter is missing or empty', () => {
    expect(() => apiUrl('/stores/:id')).toThrow('needs "id"');
    expect(() => apiUrl('/stores/:id', { id: '' })).toThrow('needs "id"');
  });
});

describe('apiQuery', () => {
  it('leaves out what is absent and keeps zero and false', () => {
    expect(apiQuery({ a: undefined, b: null, c: '', d: 0, e: false, f: [] }).toString()).toBe(
      'd=0&e=false',
    );
  });

  it('joins a list by commas', () => {
    expect(apiQuery({ states: ['open', 'overdue'] }).get('states')).toBe('open,overdue');
  });
});
