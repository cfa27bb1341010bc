import { formFaults } from '../../ui/form/form-faults';
import { fieldWord } from '../version-changes/change-words';
import type { DraftForm } from './draft-form';

/** The name of every faulty field of a draft by its path: "Step 3, Help, Español". */
export function draftLabels(form: DraftForm): Readonly<Record<string, string>> {
  return Object.fromEntries(formFaults(form).map(({ path }) => [path, labelOf(path)]));
}

/**
 * @example labelOf('content.steps.2.help.es') // 'Step 3, Help, Español'
 */
export function labelOf(path: string): string {
  const parts = path.split('.').filter((part) => part !== 'content');
  const words: string[] = [];
  for (let i = 0; i < parts.length; i++) {
    const part = parts[i] as string;
    const index = /^\d+$/.test(parts[i + 1] ?? '') ? Number(parts[i + 1]) + 1 : null;
    if (part === 'steps' && index !== null) {
      words.push($localize`:@@procedures.step-number:Step ${index}:number:`);
    } else if (part === 'en') words.push('English');
    else if (part === 'es') words.push('Español');
    else if (!/^\d+$/.test(part))
      words.push(index ? `${fieldWord(part)} ${index}` : fieldWord(part));
  }
  return words.join(', ');
}
