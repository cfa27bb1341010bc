import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { annualElectricalHose } from './annual-electrical-hose';
import { boilOutIsolated } from './boil-out-isolated';
import { monthlyMotorCurrent } from './monthly-motor-current';
import { monthlySealCheck } from './monthly-seal-check';
import { noWaterReminder } from './no-water-reminder';
import { quarterlyPumpCoverOff } from './quarterly-pump-cover-off';
import { returnTimeLog } from './return-time-log';
import { shiftPaperCheck } from './shift-paper-check';
import { weeklyPanORing } from './weekly-pan-o-ring';

/**
 * What a new organisation can begin with. Intervals, minutes and limits without a named standard are
 * common practice: starting values, for the maker's manual to override.
 */
export const starterProcedures: readonly {
  readonly code: string;
  readonly content: ProcedureContent;
}[] = [
  { code: 'shift-paper', content: shiftPaperCheck },
  { code: 'no-water', content: noWaterReminder },
  { code: 'return-time', content: returnTimeLog },
  { code: 'weekly-pan', content: weeklyPanORing },
  { code: 'monthly-seal', content: monthlySealCheck },
  { code: 'monthly-current', content: monthlyMotorCurrent },
  { code: 'quarterly-pump', content: quarterlyPumpCoverOff },
  { code: 'boil-out', content: boilOutIsolated },
  { code: 'annual-electrical', content: annualElectricalHose },
];
