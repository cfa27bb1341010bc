import {
  type DateOrder,
  type ImportField,
  type ImportKind,
  fieldsOf,
  importFields,
} from './import-fields';

/**
 * A heading without case, accents and punctuation.
 *
 * @example plainHeading(' Nº de Local: ') // 'n de local'
 */
export function plainHeading(heading: string): string {
  return heading
    .normalize('NFD')
    .replace(/[\u0300-\u036f\u00ba\u00aa]/g, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, ' ')
    .trim();
}

/**
 * What each column of a file is taken for, by its heading in English or Spanish; null where nothing
 * fits or another column fitted before. People correct the guess.
 *
 * @example guessFields('units', ['Store #', 'Tag', 'Colour']) // ['storeNumber', 'unitTag', null]
 */
export function guessFields(kind: ImportKind, headings: readonly string[]): (ImportField | null)[] {
  const fields = fieldsOf[kind];
  const guessed: (ImportField | null)[] = headings.map(() => null);
  const free = new Set<ImportField>(fields);
  const claim = (fits: (field: ImportField, heading: string) => boolean) =>
    headings.forEach((heading, index) => {
      if (guessed[index] !== null) return;
      const plain = plainHeading(heading);
      const field = fields.find((it) => free.has(it) && fits(it, plain));
      if (plain === '' || !field) return;
      guessed[index] = field;
      free.delete(field);
    });
  // Our own headings first, so that a file of ours always comes back as it went.
  claim((field, heading) =>
    [importFields[field].en, importFields[field].es].some((own) => plainHeading(own) === heading),
  );
  claim((field, heading) =>
    [...importFields[field].also, field.replace(/[A-Z]/g, ' $&')].some(
      (word) => plainHeading(word) === heading,
    ),
  );
  const [only] = fields;
  if (fields.length === 1 && only && !guessed.includes(only) && guessed.length > 0) {
    guessed[0] = only;
  }
  return guessed;
}

/**
 * Whether dates with slashes have the month or the day first, by the values seen: a 31 can be no
 * month. Without a sign it is what the reader's country writes.
 *
 * @example guessDateOrder(['31/05/2026'], 'mdy') // 'dmy'
 */
export function guessDateOrder(values: Iterable<string>, otherwise: DateOrder): DateOrder {
  for (const value of values) {
    const found = /^(\d{1,2})[/.-](\d{1,2})[/.-]\d{2,4}$/.exec(value.trim());
    if (found && Number(found[1]) > 12) return 'dmy';
    if (found && Number(found[2]) > 12) return 'mdy';
  }
  return otherwise;
}
