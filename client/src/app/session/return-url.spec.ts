import { safeReturnUrl } from './return-url';

describe('safeReturnUrl', () => {
  it.each([
    ['/board?from=2026-03-01', '/board?from=2026-03-01'],
    ['/tasks/7#steps', '/tasks/7#steps'],
    [undefined, '/'],
    ['', '/'],
    ['//evil.example', '/'],
    ['/\\evil.example', '/'],
    ['/\t/evil.example', '/'],
    ['https://evil.example', '/'],
    ['javascript:alert(1)', '/'],
    ['/sign-in?returnUrl=/board', '/'],
  ])('reads %p as %p', (given, expected) => {
    expect(safeReturnUrl(given)).toBe(expected);
  });
});
