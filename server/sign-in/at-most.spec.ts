import { atMost } from './at-most';

/** Work that ends when told to. */
function held() {
  let end = () => {};
  const ended = new Promise<void>((resolve) => {
    end = resolve;
  });
  return { end, work: () => ended };
}

const settled = () => new Promise((resolve) => setImmediate(resolve));

describe('atMost', () => {
  it('runs so many at once, the others in order, and refuses beyond the queue', async () => {
    const limited = atMost(1, 1);
    const [first, second] = [held(), held()];
    const started: string[] = [];
    const one = limited(() => (started.push('one'), first.work()));
    const two = limited(() => (started.push('two'), second.work()));
    await expect(limited(async () => undefined)).rejects.toMatchObject({ status: 503 });
    expect(started).toEqual(['one']);
    first.end();
    await one;
    await settled();
    expect(started).toEqual(['one', 'two']);
    second.end();
    await two;
  });

  it('gives its turn back after a failure', async () => {
    const limited = atMost(1, 0);
    await expect(limited(() => Promise.reject(new Error('no')))).rejects.toThrow('no');
    await expect(limited(async () => 'yes')).resolves.toBe('yes');
  });
});
