import type { LifeEvent } from '../unit-api';
import { lifeEntries, lifeSpan } from './life-entries';

const event: LifeEvent = {
  id: 'found 1',
  kind: 'found',
  at: '2026-03-01T12:00:00.000Z',
  componentKind: 'pump',
  cause: 'worn-seal',
  severity: 'plan',
  what: null,
  note: 'Drip at the slot',
  person: 'Walt Brennan',
  taskId: null,
  findingId: null,
};

describe('lifeEntries', () => {
  it('says part, cause, severity and note in the reader’s language', () => {
    expect(lifeEntries([event], 'es')[0]).toMatchObject({
      at: Date.UTC(2026, 2, 1, 12),
      what: 'Bomba de filtrado · Sello del eje gastado · Programar una reparación: Drip at the slot',
      who: 'Walt Brennan',
    });
  });

  it('knows causes that are no fault, and procedures by their title', () => {
    const replaced = { ...event, kind: 'replaced' as const, cause: 'precaution', severity: null };
    expect(lifeEntries([{ ...replaced, note: '' }], 'en')[0]?.what).toBe(
      'Filter pump · As a precaution, no fault shown',
    );
    const inspected = { ...event, componentKind: null, cause: null, severity: null, note: '' };
    const what = { en: 'Pump seal', es: 'Sello de la bomba' };
    expect(lifeEntries([{ ...inspected, what }], 'en')[0]?.what).toBe('Pump seal');
  });
});

describe('lifeSpan', () => {
  const now = Date.UTC(2026, 11, 1);

  it('reaches from the first event to now', () => {
    const first = Date.UTC(2020, 0, 1);
    const { from, to } = lifeSpan([{ at: first }], now);
    expect(from).toBeLessThan(first);
    expect(to).toBeGreaterThan(now);
  });

  it('covers half a year where nothing happened', () => {
    const { from, to } = lifeSpan([], now);
    expect(to - from).toBeGreaterThan(180 * 86_400_000);
  });
});
