import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil, keepDry } from './common-texts';

/** For the store, once a week: pan, pickup and O-ring, cold. */
export const weeklyPanORing: ProcedureContent = {
  title: both('Pan and O-ring, weekly', 'Bandeja y O-ring, semanal'),
  purpose: both(
    'A pan that seats badly or a cracked O-ring lets the pump draw air; hard crumbs in the pickup starve it.',
    'Una bandeja mal asentada o un O-ring agrietado hacen que la bomba aspire aire; las migas duras en la toma la dejan sin aceite.',
  ),
  minutes: 15,
  tools: [
    both('Scraper and lint-free cloth', 'Espátula y paño sin pelusa'),
    both('Flashlight', 'Linterna'),
  ],
  parts: [
    both('Food-grade O-ring of the right size', 'O-ring de grado alimenticio del tamaño correcto'),
  ],
  cautions: [
    hotOil,
    adultsOnly,
    both(
      'Do this with the fryer off and the pan empty and cool to the touch of a probe, not of a hand.',
      'Hágalo con la freidora apagada y la bandeja vacía y fría; compruébelo con un termómetro, no con la mano.',
    ),
    keepDry,
  ],
  steps: [
    {
      kind: 'number',
      key: 'pan-temperature',
      text: both(
        'Temperature of the pan before you touch it',
        'Temperatura de la bandeja antes de tocarla',
      ),
      caution: both(
        'Wait if it reads more than the limit. Oil left in a corner stays hot longest.',
        'Espere si marca más que el límite. El aceite que queda en una esquina tarda más en enfriarse.',
      ),
      required: true,
      number: {
        unit: '°F',
        high: 100,
        basis: both(
          'The limit that US federal rules set for handling by 14- and 15-year-olds, used here for everybody (from memory).',
          'El límite de las normas federales de EE. UU. para jóvenes de 14 y 15 años, usado aquí para todos (citado de memoria).',
        ),
      },
    },
    {
      kind: 'check',
      key: 'pan-clean',
      text: both(
        'Pan and screen scraped and washed away from the line, every part dry, all in the right order',
        'Bandeja y malla raspadas y lavadas lejos de la línea, cada pieza seca y todo en el orden correcto',
      ),
      required: true,
      component: 'pan',
      cause: 'pan-damage',
      severity: 'watch',
    },
    {
      kind: 'choice',
      key: 'screen',
      text: both('Screen and frame', 'Malla y marco'),
      required: true,
      component: 'pan',
      cause: 'pan-damage',
      choices: [
        { key: 'flat', text: both('Flat and whole', 'Planos y enteros') },
        {
          key: 'bent',
          text: both('Bent or torn', 'Doblados o rotos'),
          outOfLimit: true,
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'choice',
      key: 'o-ring',
      text: both('O-ring of the pickup', 'O-ring de la toma'),
      help: both(
        'Wipe it, look at it in good light, roll it between two fingers, oil it lightly.',
        'Límpielo, mírelo con buena luz, gírelo entre dos dedos y aceítelo apenas.',
      ),
      required: true,
      component: 'pan',
      cause: 'o-ring-leak',
      choices: [
        { key: 'good', text: both('Round, soft, no cracks', 'Redondo, flexible, sin grietas') },
        { key: 'changed', text: both('Worn: changed it', 'Gastado: lo cambié') },
        {
          key: 'bad',
          text: both(
            'Cracked, flat or missing, none to replace it',
            'Agrietado, aplanado o ausente, sin repuesto',
          ),
          outOfLimit: true,
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'check',
      key: 'pickup-clear',
      text: both(
        'Pickup tube clear of crumbs and hard fat',
        'Tubo de toma libre de migas y grasa dura',
      ),
      required: true,
      component: 'pan',
      cause: 'solid-fat',
      severity: 'plan',
    },
    {
      kind: 'check',
      key: 'hose-cord-casters',
      text: both(
        'Hose, cord, plug and casters: no cuts, no heat marks, no oil on the floor below',
        'Manguera, cable, enchufe y ruedas: sin cortes, sin marcas de calor, sin aceite en el piso',
      ),
      required: true,
      component: 'hose',
      cause: 'hose-damage',
      severity: 'stop',
    },
  ],
};
