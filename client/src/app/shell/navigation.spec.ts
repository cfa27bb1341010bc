import type { NavigationItem } from './navigation';
import { landingPath } from './navigation';

const items: NavigationItem[] = [
  { path: 'board', label: 'Board', icon: 'board', anyOf: ['board.read'] },
  { path: 'today', label: 'Today', icon: 'route', anyOf: ['today.read'] },
  { path: 'digests', label: 'Digests', icon: 'mail', anyOf: ['digests.read'] },
];

describe('landingPath', () => {
  it("starts at the role's own page", () => {
    expect(landingPath(['technician'], () => true, items)).toBe('/today');
    expect(landingPath(['account-owner'], () => true, items)).toBe('/digests');
  });

  it('prefers planning to driving for who does both', () => {
    expect(landingPath(['technician', 'regional-facility-manager'], () => true, items)).toBe(
      '/board',
    );
  });

  it('falls back to the first page that may be seen', () => {
    expect(landingPath(['trainer'], (ability) => ability === 'digests.read', items)).toBe(
      '/digests',
    );
  });

  it('falls back to the account', () => {
    expect(landingPath([], () => false, items)).toBe('/account');
  });
});
