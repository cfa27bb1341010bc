import type { Locale } from '../mail/locale';

/** The sentences of the digest in one language; figures come in already written out. */
interface DigestWords {
  subject(chain: string, month: string): string;
  preview(rate: string, overdue: string): string;
  title(chain: string, month: string): string;
  onTime: string;
  change: string;
  /** What the rate is made of, said once, so that nobody has to guess. */
  basis(onTime: string, counted: string): string;
  leftOut(excused: string, covered: string): string;
  noWindows: string;
  points(signed: string): string;
  noChange: string;
  overdue: string;
  notDone: string;
  findings: string;
  cost: string;
  decide: string;
  nothingToDecide: string;
  stopped(cause: string, place: string, since: string): string;
  stoppedTitle: string;
  lowTitle: string;
  low(store: string, rate: string, counts: string): string;
  months: string;
  monthsCaption: string;
  month: string;
  stores: string;
  storesCaption: string;
  store: string;
  rate: string;
  late: string;
  changeColumn: string;
  of(onTime: string, counted: string): string;
  overdueTitle: string;
  overdueCaption: string;
  overdueNone: string;
  count: string;
  oldest: string;
  findingsTitle: string;
  findingsCaption: string;
  findingsColumn: string;
  findingsNone: string;
  cause: string;
  stop: string;
  unsettled: string;
  repairsTitle: string;
  repairs(count: number, written: string, parts: string, labour: string): string;
  repairsNone: string;
  more(count: string): string;
  definition: string;
  safety: string;
}

const en: DigestWords = {
  subject: (chain, month) => `${chain}: maintenance in ${month}`,
  preview: (rate, overdue) => `On time ${rate}, overdue at the month’s end ${overdue}`,
  title: (chain, month) => `${chain}, ${month}`,
  onTime: 'on time',
  change: 'against the month before',
  basis: (onTime, counted) => `${onTime} of ${counted} tasks were done within their window.`,
  leftOut: (excused, covered) =>
    `Left out of the rate: ${excused} excused, ${covered} covered by a larger inspection.`,
  noWindows: 'No window of a task closed in this month, so there is no rate.',
  points: (signed) => `${signed} points`,
  noChange: 'no change',
  overdue: 'overdue at the month’s end',
  notDone: 'Not done',
  findings: 'findings',
  cost: 'parts and labor',
  decide: 'What to decide',
  nothingToDecide: 'Nothing waits for a decision: no unit is stopped and no store fell behind.',
  stopped: (cause, place, since) => `${place}: ${cause}, since ${since}`,
  stoppedTitle: 'Units that findings say to stop using, not settled',
  lowTitle: 'Stores with fewer than four of five tasks on time',
  low: (store, rate, counts) => `${store}: ${rate} (${counts})`,
  months: 'Month by month',
  monthsCaption: 'Tasks whose window closed in each month',
  month: 'Month',
  stores: 'Stores, lowest rate first',
  storesCaption: 'Tasks whose window closed in the month; change in percentage points',
  store: 'Store',
  rate: 'On time',
  late: 'Late',
  changeColumn: 'Change',
  of: (onTime, counted) => `${onTime} of ${counted}`,
  overdueTitle: 'Overdue at the month’s end',
  overdueCaption: 'Tasks past their window that could still be done late',
  overdueNone: 'No task was overdue as the month ended.',
  count: 'Tasks',
  oldest: 'Oldest window closed',
  findingsTitle: 'Findings by cause',
  findingsCaption: 'Findings written down in the month',
  findingsColumn: 'Findings',
  findingsNone: 'No findings were written down in this month.',
  cause: 'Cause',
  stop: 'Stop using it',
  unsettled: 'Not settled',
  repairsTitle: 'Repairs',
  repairs: (count, written, parts, labour) =>
    `${count === 1 ? '1 repair' : `${written} repairs`}: parts ${parts}, labor ${labour}.`,
  repairsNone: 'No repairs were recorded in this month.',
  more: (count) => `and ${count} more`,
  definition:
    'On-time rate: tasks done within their window ÷ tasks whose window closed in the month, less excused and covered. A task counts on the local day of its store on which its window closed. Figures are kept as they stood when this digest was made.',
  safety:
    'A rate says what was done, not that a unit is safe. Local codes and licensed practice decide.',
};

const es: DigestWords = {
  subject: (chain, month) => `${chain}: mantenimiento de ${month}`,
  preview: (rate, overdue) => `A tiempo ${rate}, vencidas al cierre del mes ${overdue}`,
  title: (chain, month) => `${chain}, ${month}`,
  onTime: 'a tiempo',
  change: 'respecto al mes anterior',
  basis: (onTime, counted) => `${onTime} de ${counted} tareas se hicieron dentro de su ventana.`,
  leftOut: (excused, covered) =>
    `Fuera del cálculo: ${excused} dispensadas, ${covered} cubiertas por una inspección mayor.`,
  noWindows: 'Ninguna ventana cerró este mes, así que no hay porcentaje.',
  points: (signed) => `${signed} puntos`,
  noChange: 'sin cambio',
  overdue: 'vencidas al cierre del mes',
  notDone: 'No hechas',
  findings: 'hallazgos',
  cost: 'repuestos y mano de obra',
  decide: 'Lo que hay que decidir',
  nothingToDecide:
    'Nada espera una decisión: ninguna unidad está detenida y ninguna tienda quedó atrás.',
  stopped: (cause, place, since) => `${place}: ${cause}, desde el ${since}`,
  stoppedTitle: 'Unidades que un hallazgo pide dejar de usar, sin resolver',
  lowTitle: 'Tiendas con menos de cuatro de cada cinco tareas a tiempo',
  low: (store, rate, counts) => `${store}: ${rate} (${counts})`,
  months: 'Mes a mes',
  monthsCaption: 'Tareas cuya ventana cerró en cada mes',
  month: 'Mes',
  stores: 'Tiendas, de menor a mayor porcentaje',
  storesCaption: 'Tareas cuya ventana cerró en el mes; cambio en puntos porcentuales',
  store: 'Tienda',
  rate: 'A tiempo',
  late: 'Tarde',
  changeColumn: 'Cambio',
  of: (onTime, counted) => `${onTime} de ${counted}`,
  overdueTitle: 'Vencidas al cierre del mes',
  overdueCaption: 'Tareas con la ventana cerrada que todavía podían hacerse con retraso',
  overdueNone: 'Ninguna tarea estaba vencida al cerrar el mes.',
  count: 'Tareas',
  oldest: 'Ventana más antigua cerrada',
  findingsTitle: 'Hallazgos por causa',
  findingsCaption: 'Hallazgos anotados en el mes',
  findingsColumn: 'Hallazgos',
  findingsNone: 'No se anotaron hallazgos este mes.',
  cause: 'Causa',
  stop: 'Dejar de usar',
  unsettled: 'Sin resolver',
  repairsTitle: 'Reparaciones',
  repairs: (count, written, parts, labour) =>
    `${count === 1 ? '1 reparación' : `${written} reparaciones`}: repuestos ${parts}, mano de obra ${labour}.`,
  repairsNone: 'No se registraron reparaciones este mes.',
  more: (count) => `y ${count} más`,
  definition:
    'Porcentaje a tiempo: tareas hechas dentro de su ventana ÷ tareas cuya ventana cerró en el mes, sin las dispensadas ni las cubiertas. Una tarea cuenta el día local de su tienda en que cerró su ventana. Las cifras se conservan como estaban al hacer este resumen.',
  safety:
    'El porcentaje dice qué se hizo, no que una unidad sea segura. Deciden las normas locales y la práctica con licencia.',
};

export const digestWords: Readonly<Record<Locale, DigestWords>> = { en, es };
