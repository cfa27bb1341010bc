import type { Cause, Severity } from '@shared/findings/cause';

export interface RepairPlan {
  readonly at: Date;
  readonly replaced: readonly ('pump' | 'motor' | 'hose')[];
  readonly minutes: number;
  readonly partsCents: number;
  readonly labourCents: number;
  readonly note: string;
}

const DAY = 86_400_000;

/** Days until it is settled, from a chance between 0 and 1: most soon, some very late. */
const waits: Readonly<Record<Severity, (chance: number) => number>> = {
  stop: (chance) => 1 + 2 * chance,
  plan: (chance) => 6 + 60 * chance * chance,
  watch: (chance) => 25 + 90 * chance,
};

const prices = { pump: 48_500, motor: 43_900, hose: 8_600 };
const LABOUR_CENTS_PER_MINUTE = 165;

const atFault: Partial<Record<Cause, 'pump' | 'motor' | 'hose'>> = {
  'worn-seal': 'pump',
  'water-corrosion': 'pump',
  'hardened-oil-in-motor': 'motor',
  'start-switch': 'motor',
  bearing: 'motor',
  winding: 'motor',
  'hose-damage': 'hose',
};

/**
 * When and how a finding is repaired. About one pump or motor in four takes its sound neighbour along:
 * the needless pair that the product is there to end.
 */
export function planRepair(
  cause: Cause,
  severity: Severity,
  foundAt: Date,
  random: () => number,
): RepairPlan {
  const wait = waits[severity](random());
  const part = atFault[cause];
  const pair = part !== undefined && part !== 'hose' && random() < 0.26;
  const replaced = pair ? (['pump', 'motor'] as const) : part ? [part] : [];
  const minutes = Math.round(20 + 40 * random() + 45 * replaced.length);
  return {
    at: new Date(foundAt.getTime() + wait * DAY),
    replaced,
    minutes,
    partsCents: replaced.reduce((sum, it) => sum + prices[it], 0) || (part ? 0 : 2_400),
    labourCents: minutes * LABOUR_CENTS_PER_MINUTE,
    note: pair
      ? 'Replaced as a pair.'
      : replaced.length > 0
        ? 'Replaced the part at fault.'
        : 'Cleaned and adjusted.',
  };
}
