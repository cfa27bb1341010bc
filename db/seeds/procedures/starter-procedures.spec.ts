import { procedureContent } from '@shared/procedures/procedure-content';
import { publishFaults } from '@shared/procedures/publish-faults';
import { starterProcedures } from './starter-procedures';

describe('starter procedures', () => {
  it.each(starterProcedures)('$code fits the contract and may be published', ({ content }) => {
    expect(procedureContent.parse(content)).toEqual(content);
    expect(publishFaults(content)).toEqual([]);
  });

  it('have codes of their own', () => {
    expect(new Set(starterProcedures.map(({ code }) => code)).size).toBe(starterProcedures.length);
  });

  // 29 CFR 570.34 restricts the work for the young; the product gives it to nobody under 18.
  it.each(starterProcedures.filter(({ code }) => code !== 'no-water'))(
    '$code says who is too young for it',
    ({ content }) => {
      expect(content.cautions.some(({ en }) => en.includes('under 18'))).toBe(true);
      expect(content.cautions.some(({ es }) => es.includes('menores de 18'))).toBe(true);
    },
  );

  it.each(starterProcedures)('$code promises no safety', ({ content }) => {
    expect(JSON.stringify(content)).not.toMatch(/\b(is|are) safe\b|\bes segur[oa]\b/i);
  });

  it.each(starterProcedures)(
    '$code says where each of its number limits comes from',
    ({ content }) => {
      for (const step of content.steps) {
        if (step.kind === 'number') expect(step.number.basis).toBeDefined();
      }
    },
  );
});
