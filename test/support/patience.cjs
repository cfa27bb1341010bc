// A shared, noisy machine may be slow without anything being wrong.
jest.setTimeout(120_000);
