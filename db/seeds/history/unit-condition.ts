/**
 * What a unit's parts have been through, as a sketch of the trade's common sense (common practice, no
 * handbook gives these rates): fines that pass the paper wear the seal and pack the rotors; a seal
 * that weeps unattended lets oil into the motor; water rusts a pump from the inside.
 */
export interface UnitCondition {
  /** 1 is a seal that weeps. */
  sealWear: number;
  /** 1 is a pair of rotors that labours. */
  debris: number;
  rust: boolean;
  oilInMotor: boolean;
  bearingRough: boolean;
  startSwitchBad: boolean;
  hoseStiff: boolean;
  oRingBad: boolean;
  /** How this specimen takes wear, about 1. */
  readonly toughness: number;
}

/** A seal on good paper lasts about two and a half years here. */
const CLEAN_WEAR_PER_DAY = 1 / 900;
const WEAR_PER_MISSED_CHECK = 1 / 170;
const DEBRIS_PER_MISSED_CHECK = 1 / 150;
const DEBRIS_PER_DAY = 1 / 1800;

/** A unit some way into its life. */
export function conditionAtStart(random: () => number): UnitCondition {
  return {
    sealWear: 0.65 * random(),
    debris: 0.4 * random(),
    rust: false,
    oilInMotor: false,
    bearingRough: false,
    startSwitchBad: false,
    hoseStiff: false,
    oRingBad: false,
    toughness: 0.75 + 0.5 * random(),
  };
}

/** One day of frying, with so many paper checks missed. */
export function liveDay(unit: UnitCondition, missedChecks: number, random: () => number): void {
  const wear = CLEAN_WEAR_PER_DAY + missedChecks * WEAR_PER_MISSED_CHECK;
  unit.sealWear += wear / unit.toughness;
  unit.debris += (DEBRIS_PER_DAY + missedChecks * DEBRIS_PER_MISSED_CHECK) / unit.toughness;
  if (unit.sealWear > 1.3 && random() < 0.03) unit.oilInMotor = true;
  if (random() < 1 / 2600) unit.bearingRough = true;
  if (random() < 1 / 6000) unit.startSwitchBad = true;
  if (random() < 1 / 2400) unit.hoseStiff = true;
  if (random() < 1 / 900) unit.oRingBad = true;
}

/** Cleaning, resealing and new parts put right what they touch. */
export function putRight(unit: UnitCondition, cause: string, replaced: readonly string[]): void {
  if (replaced.includes('pump')) Object.assign(unit, { sealWear: 0, debris: 0, rust: false });
  if (replaced.includes('motor')) {
    Object.assign(unit, { oilInMotor: false, bearingRough: false, startSwitchBad: false });
  }
  if (replaced.includes('hose')) unit.hoseStiff = false;
  if (cause === 'debris-in-rotors') unit.debris = 0;
  if (cause === 'o-ring-leak') unit.oRingBad = false;
}
