/**
 * A key made of the first words of a text, unlike those taken: lower-case letters, digits, hyphens.
 *
 * @example uniqueKey('Motor: vents clear?', new Set()) // 'motor-vents-clear'
 * @example uniqueKey('', new Set(['step'])) // 'step-2'
 */
export function uniqueKey(text: string, taken: ReadonlySet<string>): string {
  const plain = text
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase();
  const words = plain.match(/[a-z0-9]+/g) ?? [];
  const base = words.slice(0, 4).join('-').slice(0, 30).replace(/-$/, '') || 'step';
  let key = base;
  for (let n = 2; taken.has(key); n++) key = `${base}-${n}`;
  return key;
}
