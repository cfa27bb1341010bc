import { newId } from './new-id';

describe('newId', () => {
  it('has the version and variant of RFC 9562 section 5.4', () => {
    for (let i = 0; i < 50; i++) {
      expect(newId()).toMatch(
        /^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/,
      );
    }
  });

  it('does not repeat', () => {
    expect(new Set(Array.from({ length: 1000 }, newId)).size).toBe(1000);
  });
});
