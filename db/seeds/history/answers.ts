import type { StepReading } from '@shared/inspections/inspections-contract';
import type { MotorNameplate } from '@shared/procedures/within-limit';
import type { UnitCondition } from './unit-condition';

type Answer = Omit<StepReading, 'step'>;
type Answers = Readonly<Record<string, Answer>>;

const ok = (value: boolean) => ({ kind: 'check', ok: value }) as Answer;
const pick = (choice: string) => ({ kind: 'choice', choice }) as Answer;
const measured = (value: number, digits = 0) =>
  ({ kind: 'number', value: Number(value.toFixed(digits)) }) as Answer;

/** What a technician finds on a unit in this condition, by the procedure's code and step keys. */
export function technicianAnswers(
  code: string,
  unit: UnitCondition,
  nameplate: MotorNameplate,
  random: () => number,
): Answers {
  const spread = (around: number, by: number) => around + by * (2 * random() - 1);
  const amps =
    (nameplate.amps ?? 9) * spread(0.8, 0.04) * (1 + 0.32 * Math.max(0, unit.debris - 0.45));
  switch (code) {
    case 'monthly-seal': {
      const drops = Math.max(0, Math.ceil((unit.sealWear - 1) * 14));
      return {
        'slot-open': ok(random() > 0.004),
        'slot-state': pick(unit.sealWear >= 1 ? 'wet' : unit.sealWear > 0.75 ? 'trace' : 'dry'),
        'drops-per-minute': measured(drops),
        'shaft-colour': pick(unit.rust ? 'rust' : 'bright'),
        'motor-face-dry': ok(!unit.oilInMotor),
      };
    }
    case 'monthly-current':
      return {
        'vents-clear': ok(random() > 0.01),
        'oil-temperature': measured(spread(352, 14)),
        'running-volts': measured((nameplate.volts ?? 115) * spread(1, 0.035), 1),
        'running-amps': measured(amps, 1),
        'overload-trips': pick(unit.debris > 1.1 ? 'more' : random() < 0.05 ? 'one' : 'none'),
        sound: pick(unit.startSwitchBad ? 'hum' : unit.bearingRough ? 'bearing' : 'even'),
      };
    case 'quarterly-pump':
      return {
        'locked-out': ok(true),
        'found-inside': pick(
          unit.rust ? 'rust' : unit.debris > 1 ? 'packed' : unit.debris > 0.7 ? 'fines' : 'clean',
        ),
        'no-scoring': ok(unit.debris < 1.6),
        coupling: pick(random() < 0.06 ? 'tightened' : 'square'),
        'turns-by-hand': ok(true),
        direction: ok(true),
        'flow-share': measured(Math.min(100, spread(103, 5) - 22 * unit.debris)),
      };
    case 'annual-electrical':
      return {
        'locked-out': ok(true),
        'cord-plug': pick(random() < 0.02 ? 'worn' : 'sound'),
        terminals: ok(!unit.oilInMotor),
        insulation: measured(unit.oilInMotor ? spread(8, 2) : spread(160, 90)),
        windings: pick('even'),
        'start-switch': ok(!unit.startSwitchBad),
        hoses: pick(unit.hoseStiff ? 'stiff' : 'sound'),
        'running-amps': measured(amps, 1),
      };
    default:
      return {};
  }
}

/** What a store's crew ticks; its shift checks say little about the parts. */
export function crewAnswers(
  code: string,
  store: { readonly waterGotIn: boolean; readonly oRingBad: boolean },
  random: () => number,
): Answers {
  switch (code) {
    case 'shift-paper':
      return {
        'paper-condition': pick(
          random() < 0.42 ? 'changed' : random() < 0.0012 ? 'none-left' : 'good',
        ),
        'paper-seated': ok(true),
        'crumbs-emptied': ok(true),
        bubbles: pick(random() < 0.03 ? 'not-filtered' : 'at-end'),
      };
    case 'no-water':
      return {
        'everyone-told': ok(true),
        'parts-dry': ok(true),
        'water-got-in': pick(store.waterGotIn ? 'yes' : 'no'),
      };
    case 'weekly-pan':
      return {
        'pan-temperature': measured(72 + 20 * random()),
        'pan-clean': ok(random() > 0.004),
        screen: pick(random() < 0.004 ? 'bent' : 'flat'),
        'o-ring': pick(store.oRingBad ? (random() < 0.8 ? 'changed' : 'bad') : 'good'),
        'pickup-clear': ok(true),
        'hose-cord-casters': ok(true),
      };
    case 'boil-out':
      return {
        'filter-apart': ok(true),
        'vat-temperature': measured(95 + 45 * random()),
        'boil-minutes': measured(20 + 10 * random()),
        'drained-by-hand': ok(true),
        ph: pick('neutral'),
        'all-dry': ok(true),
      };
    default:
      return {};
  }
}
