import { heatStep } from './heat-step';

describe('heatStep', () => {
  it.each([
    [null, 'none'],
    [NaN, 'none'],
    [0, 'low'],
    [0.6999, 'low'],
    [0.7, 'weak'],
    [0.8, 'fair'],
    [0.9, 'good'],
    [0.9699, 'good'],
    [0.97, 'high'],
    [1, 'high'],
  ] as const)('%p is %p', (rate, step) => expect(heatStep(rate)).toBe(step));
});
