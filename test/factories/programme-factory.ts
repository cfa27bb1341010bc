import { randomUUID } from 'node:crypto';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { TestDatabase } from '@test/support/test-database';
import { insert } from './organisation-factory';

/** A published procedure of one step. */
export async function makeProcedure(db: TestDatabase, organisationId: string): Promise<string> {
  const id = await insert(db, 'procedures', {
    organisation_id: organisationId,
    code: `look-${randomUUID()}`,
  });
  const text = (it: string) => ({ en: it, es: it });
  await insert(db, 'procedure_versions', {
    organisation_id: organisationId,
    procedure_id: id,
    number: 1,
    published_at: new Date('2026-01-01T00:00:00Z'),
    content: {
      title: text('Look'),
      purpose: text('To see'),
      minutes: 5,
      tools: [],
      parts: [],
      cautions: [text('Hot oil')],
      steps: [{ kind: 'check', key: 'seen', text: text('Seen'), required: true }],
    },
  });
  return id;
}

/** A rule for the store's or technician's hands, monthly on the first unless told otherwise. */
export const ruleOf = (
  procedureId: string,
  more: Partial<RuleDefinition> = {},
): RuleDefinition => ({
  procedureId,
  name: `Rule ${randomUUID()}`,
  audience: 'technician',
  appliesTo: 'unit',
  unitKind: null,
  pumpFace: null,
  recurrence: {
    startsLocal: '2026-01-01T09:00:00',
    rrules: ['FREQ=MONTHLY;BYMONTHDAY=1'],
    rdates: [],
    exdates: [],
  },
  window: { kind: 'days', before: 3, after: 3, late: null, dueSoon: 2 },
  horizonDays: 60,
  rank: 0,
  ...more,
});
