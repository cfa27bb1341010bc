import type { ValidatorFn } from '@angular/forms';

const MONEY = /^\d{1,6}([.,]\d{1,2})?$/;

/**
 * Dollars as somebody typed them, in cents; an empty field is nothing spent.
 *
 * @returns null where it is no amount
 * @example centsOf('84.5') // 8450
 * @example centsOf('') // 0
 */
export function centsOf(typed: string): number | null {
  const text = typed.trim().replace(/^\$\s*/, '');
  if (text === '') return 0;
  if (!MONEY.test(text)) return null;
  const [whole = '0', part = ''] = text.split(/[.,]/);
  return Number(whole) * 100 + Number(part.padEnd(2, '0'));
}

/** Refuses what {@link centsOf} cannot read. */
export const isMoney: ValidatorFn = ({ value }) =>
  centsOf(String(value)) === null
    ? { words: $localize`:@@findings.money:Give an amount in dollars, such as 84.50.` }
    : null;
