/**
 * A whole number given to a bench as `--name 5`.
 * @throws Error that says how to write it
 */
export function wholeNumber(args: readonly string[], name: string, otherwise: number): number {
  const at = args.indexOf(`--${name}`);
  if (at < 0) return otherwise;
  const value = Number(args[at + 1]);
  if (Number.isInteger(value) && value > 0) return value;
  throw new Error(`Write a whole number after --${name}.`);
}
