import { causeWords, severityWords } from '@shared/findings/cause';
import type { ComponentKind } from '@shared/procedures/step-kind';
import { type Words, instant, text } from '../exports/export-column';
import type { Finding } from './finding-queries';

const parts: Readonly<Record<ComponentKind, Words>> = {
  pump: { en: 'pump', es: 'bomba' },
  motor: { en: 'motor', es: 'motor' },
  pan: { en: 'pan', es: 'bandeja' },
  hose: { en: 'hose', es: 'manguera' },
};

/** What a file of findings shows, in the order of the list on screen. */
export const findingFileColumns = [
  text<Finding>({ en: 'What was found', es: 'Qué se encontró' }, (row) => causeWords[row.cause]),
  text<Finding>({ en: 'Urgency', es: 'Urgencia' }, (row) => severityWords[row.severity]),
  text<Finding>(
    { en: 'Part', es: 'Pieza' },
    (row) => row.componentKind && parts[row.componentKind],
  ),
  text<Finding>({ en: 'Store', es: 'Tienda' }, (row) => row.storeNumber),
  text<Finding>({ en: 'Store name', es: 'Nombre de la tienda' }, (row) => row.storeName),
  text<Finding>({ en: 'Unit', es: 'Unidad' }, (row) => row.unitTag),
  text<Finding>({ en: 'Note', es: 'Nota' }, (row) => row.note),
  instant<Finding>({ en: 'Found', es: 'Encontrado' }, (row) => row.foundAt),
  text<Finding>({ en: 'Found by', es: 'Encontrado por' }, (row) => row.foundBy),
  instant<Finding>({ en: 'Settled', es: 'Resuelto' }, (row) => row.settledAt),
  text<Finding>({ en: 'Settled by', es: 'Resuelto por' }, (row) => row.settledBy),
  text<Finding>({ en: 'What was done', es: 'Qué se hizo' }, (row) => row.settledNote),
];
