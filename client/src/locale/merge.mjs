// Gathers es/<feature>.json into messages.es.json, which the builder reads, and fails with the ids
// by name when a text used in the code has no Spanish, a Spanish text is no longer used, or the
// two differ in their placeholders. Run before each build; `--check` writes nothing.
import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const here = dirname(fileURLToPath(import.meta.url));

export function filesUnder(folder, pattern) {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return filesUnder(path, pattern);
    return pattern.test(name) ? [path] : [];
  });
}

/** Every id with a fixed name in a file: `i18n="@@id"` and `$localize` with `:@@id:`. */
export function idsIn(source) {
  return [...source.matchAll(/@@([a-z0-9][a-z0-9.-]*)/g)].map((match) => match[1]);
}

/** English texts of `$localize` by id: those whose placeholders can be read without a compiler. */
export function tagsIn(source) {
  return [...source.matchAll(/\$localize`:@@([a-z0-9.-]+):((?:[^`\\]|\\.)*)`/g)].map((match) => [
    match[1],
    [...match[2].matchAll(/\}:([A-Za-z0-9_]+):/g)].map((name) => name[1]).sort(),
  ]);
}

const placeholders = (text) =>
  [...new Set([...text.matchAll(/\{\$([A-Za-z0-9_]+)\}/g)].map((match) => match[1]))].sort();

function readTranslations(folder, faults) {
  const texts = new Map();
  for (const path of filesUnder(folder, /\.json$/)) {
    const feature = basename(path, '.json');
    for (const [id, text] of Object.entries(JSON.parse(readFileSync(path, 'utf8')))) {
      if (!id.startsWith(`${feature}.`)) faults.push(`${id} does not belong in es/${feature}.json`);
      texts.set(id, text);
    }
  }
  return texts;
}

function main() {
  const faults = [];
  const used = new Map();
  const tags = new Map();
  for (const path of filesUnder(join(here, '../app'), /(?<!\.spec)\.(ts|html)$/)) {
    const source = readFileSync(path, 'utf8');
    for (const id of idsIn(source)) if (!used.has(id)) used.set(id, path);
    for (const [id, names] of tagsIn(source)) tags.set(id, names);
  }
  const texts = readTranslations(join(here, 'es'), faults);
  for (const [id, path] of used) {
    if (!texts.has(id)) faults.push(`${id} has no Spanish text (used in ${path})`);
  }
  for (const [id, text] of texts) {
    if (!used.has(id)) faults.push(`${id} is translated but not used`);
    const wanted = tags.get(id);
    if (wanted && placeholders(text).join() !== [...new Set(wanted)].join()) {
      faults.push(
        `${id} must hold ${wanted.map((name) => `{$${name}}`).join(' ') || 'no placeholder'}`,
      );
    }
  }
  if (faults.length > 0) {
    console.error(`${faults.length} faults in the translations:\n  ${faults.join('\n  ')}`);
    process.exit(1);
  }
  if (process.argv.includes('--check')) return;
  const translations = Object.fromEntries([...texts].sort(([a], [b]) => (a < b ? -1 : 1)));
  writeFileSync(
    join(here, 'messages.es.json'),
    `${JSON.stringify({ locale: 'es-US', translations }, null, 2)}\n`,
  );
}

main();
