import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { both, keepDry } from './common-texts';

/** For the store: a reminder to be read and acknowledged, with one honest question. */
export const noWaterReminder: ProcedureContent = {
  title: both('Keep water out of the filter', 'Sin agua en el filtro'),
  purpose: both(
    'Water in the filter system flashes to steam, washes the oil off gears and seal, and rusts the pump until it destroys its own rotors.',
    'El agua en el sistema de filtrado se vuelve vapor, quita el aceite de los engranajes y del sello, y oxida la bomba hasta que destruye sus propios rotores.',
  ),
  minutes: 1,
  tools: [],
  parts: [],
  cautions: [keepDry],
  steps: [
    {
      kind: 'check',
      key: 'everyone-told',
      text: both(
        'Everyone on this shift who cleans or filters knows: no water, ice or cleaner through the pump, ever',
        'Todos los que limpian o filtran en este turno lo saben: nunca agua, hielo ni limpiador por la bomba',
      ),
      required: true,
    },
    {
      kind: 'check',
      key: 'parts-dry',
      text: both(
        'Washed pan parts are bone dry before they go back in',
        'Las piezas lavadas de la bandeja están totalmente secas antes de volver a su lugar',
      ),
      required: true,
      component: 'pan',
    },
    {
      kind: 'choice',
      key: 'water-got-in',
      text: both(
        'Did water get into the system since the last reminder?',
        '¿Entró agua en el sistema desde el último recordatorio?',
      ),
      help: both(
        'Saying so early saves the pump. Nobody is blamed for the answer.',
        'Avisar pronto salva la bomba. Nadie será culpado por la respuesta.',
      ),
      required: true,
      component: 'pump',
      cause: 'water-corrosion',
      choices: [
        { key: 'no', text: both('No', 'No') },
        {
          key: 'yes',
          text: both('Yes, or maybe', 'Sí, o tal vez'),
          outOfLimit: true,
          severity: 'plan',
        },
      ],
    },
  ],
};
