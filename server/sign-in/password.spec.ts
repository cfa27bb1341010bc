import { hashPassword, passwordFaults, passwordFits } from './password';

describe('passwordFaults', () => {
  const reasons = (password: string, context: string[] = []) =>
    passwordFaults(password, context).map(({ reason }) => reason);

  it.each([
    ['eleven char', 'password-short'],
    ['x'.repeat(129), 'password-long'],
    ['password1234', 'password-common'],
    ['QWERTYUIOP12', 'password-common'],
  ])('refuses %s', (password, reason) => {
    expect(reasons(password)).toEqual([reason]);
  });

  it('refuses what is made of the person alone', () => {
    const context = ['Rosa Whitfield', 'rosa@kettle.example', 'Kettle & Flue'];
    expect(reasons('Whitfield2026!', context)).toEqual(['password-common']);
    expect(reasons('rosawhitfield', context)).toEqual(['password-common']);
    expect(reasons('whitfield mends copper pans', context)).toEqual([]);
  });

  it('asks for no digits, signs or capitals, and counts characters, not bytes', () => {
    expect(reasons('kelp amber steel')).toEqual([]);
    expect(reasons('ñ'.repeat(11))).toEqual(['password-short']);
  });

  it('names the field it was sent under', () => {
    expect(passwordFaults('short', [], 'newPassword')[0]?.field).toBe('newPassword');
  });
});

describe('passwordFits', () => {
  it('holds a password against its hash, and says no without one', async () => {
    const hash = await hashPassword('kelp amber steel');
    // OWASP Password Storage Cheat Sheet: argon2id with 19 MiB, two passes, one lane.
    expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,(t=2,p=1)\$/);
    expect(await passwordFits(hash, 'kelp amber steel')).toBe(true);
    expect(await passwordFits(hash, 'kelp amber steal')).toBe(false);
    expect(await passwordFits(null, 'nobody has this password')).toBe(false);
  });
});
