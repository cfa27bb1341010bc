import { withoutSecrets } from './without-secrets';

describe('without secrets', () => {
  it('blots out tokens in either spelling', () => {
    const base64url = 'aB-_'.repeat(10) + 'abc';
    const hex = '0f'.repeat(32);
    expect(withoutSecrets(`open https://x.example/invitation/${base64url}?a=1`)).toBe(
      'open https://x.example/invitation/•••?a=1',
    );
    expect(withoutSecrets(`#${hex}.`)).toBe('#•••.');
  });

  it('leaves ids and prose alone', () => {
    const text = 'Task 6f0c7b7e-2f0a-4f5e-9d52-3f6d7b1c2a90 at Cedar Falls Rd';
    expect(withoutSecrets(text)).toBe(text);
  });
});
