import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil, startingValue } from './common-texts';

/** For the store: how long one vat takes to come back. The cheapest measurement there is. */
export const returnTimeLog: ProcedureContent = {
  title: both('Return time of one vat', 'Tiempo de retorno de una tina'),
  purpose: both(
    'A vat that takes longer to come back than it used to says “paper” first and “pump” next, weeks before it stops.',
    'Una tina que tarda más que antes en regresar avisa primero «papel» y luego «bomba», semanas antes de detenerse.',
  ),
  minutes: 3,
  tools: [both('Stopwatch or phone', 'Cronómetro o teléfono')],
  parts: [],
  cautions: [hotOil, adultsOnly],
  steps: [
    {
      kind: 'check',
      key: 'oil-hot',
      text: both(
        'Oil at filtering temperature; never pump it cold',
        'Aceite a temperatura de filtrado; nunca lo bombee frío',
      ),
      help: both(
        'About 350 °F. Cold oil is thick and opens the motor’s overload.',
        'Unos 175 °C (350 °F). El aceite frío es espeso y dispara la protección del motor.',
      ),
      required: true,
    },
    {
      kind: 'number',
      key: 'return-seconds',
      text: both(
        'Seconds from opening the return until bubbles come',
        'Segundos desde que abre el retorno hasta que salen burbujas',
      ),
      help: both(
        'Fifty pounds of hot oil is about seven gallons: a pump of 8 gal/min needs just under a minute, one of 4 gal/min just under two.',
        'Cincuenta libras de aceite caliente son unos 28 litros (siete galones): una bomba de 30 L/min tarda algo menos de un minuto; una de 15 L/min, algo menos de dos.',
      ),
      required: true,
      component: 'pump',
      cause: 'clogged-paper',
      severity: 'watch',
      number: { unit: 's', high: 150, basis: startingValue },
    },
    {
      kind: 'choice',
      key: 'against-usual',
      text: both(
        'Against this unit’s usual time',
        'Comparado con el tiempo habitual de esta unidad',
      ),
      help: startingValue,
      required: true,
      component: 'pump',
      cause: 'clogged-paper',
      choices: [
        { key: 'as-usual', text: both('As usual', 'Como siempre') },
        {
          key: 'quarter-longer',
          text: both('A quarter longer: change the paper', 'Una cuarta parte más: cambie el papel'),
          outOfLimit: true,
          severity: 'watch',
        },
        {
          key: 'half-longer',
          text: both('Half again as long: call service', 'La mitad más: llame a servicio'),
          outOfLimit: true,
          cause: 'debris-in-rotors',
          severity: 'plan',
        },
      ],
    },
  ],
};
