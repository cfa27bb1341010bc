import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil } from './common-texts';

/** For the store, once a shift: paper in place, nothing going past it. */
export const shiftPaperCheck: ProcedureContent = {
  title: both('Filter paper at the shift', 'Papel filtro en el turno'),
  purpose: both(
    'Fines that slip past the paper wear the pump’s seal and lock its rotors. One look a shift keeps them out.',
    'Las partículas que pasan junto al papel gastan el sello de la bomba y traban los rotores. Una mirada por turno las mantiene fuera.',
  ),
  minutes: 2,
  tools: [both('Heat-resistant gloves', 'Guantes resistentes al calor')],
  parts: [
    both('Filter paper or envelope of the right size', 'Papel o sobre filtro del tamaño correcto'),
  ],
  cautions: [hotOil, adultsOnly],
  steps: [
    {
      kind: 'choice',
      key: 'paper-condition',
      text: both('How does the paper look?', '¿Cómo está el papel?'),
      help: both(
        'Ten to twelve filterings on one paper is a common starting value; the maker’s manual decides. Change it sooner if the oil comes back slowly.',
        'De diez a doce filtrados por papel es un valor inicial común; el manual del fabricante decide. Cámbielo antes si el aceite regresa lento.',
      ),
      required: true,
      component: 'pan',
      cause: 'clogged-paper',
      choices: [
        { key: 'good', text: both('Clean enough, in one piece', 'Suficientemente limpio, entero') },
        { key: 'changed', text: both('Was due: changed it', 'Ya tocaba: lo cambié') },
        {
          key: 'none-left',
          text: both('Due, and no paper in the store', 'Ya toca y no hay papel en la tienda'),
          outOfLimit: true,
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'check',
      key: 'paper-seated',
      text: both(
        'Paper lies flat under its frame on all sides, no gap, no fold, clips closed',
        'El papel queda plano bajo el marco por todos lados, sin huecos ni dobleces, con los sujetadores cerrados',
      ),
      required: true,
      component: 'pan',
      cause: 'clogged-paper',
      severity: 'watch',
    },
    {
      kind: 'check',
      key: 'crumbs-emptied',
      text: both(
        'Crumb catch and screen emptied, screen flat, nothing missing or bent',
        'Recolector de migas y malla vacíos, malla plana, sin piezas faltantes ni dobladas',
      ),
      required: true,
      component: 'pan',
      cause: 'pan-damage',
      severity: 'watch',
    },
    {
      kind: 'choice',
      key: 'bubbles',
      text: both(
        'Watch the return: when do bubbles come?',
        'Mire el retorno: ¿cuándo salen burbujas?',
      ),
      help: both(
        'Bubbles from the start mean that the pump draws air: look at the pan’s seat and the O-ring.',
        'Burbujas desde el inicio indican que la bomba aspira aire: revise el asiento de la bandeja y el O-ring.',
      ),
      required: true,
      component: 'pan',
      cause: 'o-ring-leak',
      choices: [
        {
          key: 'at-end',
          text: both('Only when the pan runs empty', 'Solo al vaciarse la bandeja'),
        },
        {
          key: 'from-start',
          text: both('From the start', 'Desde el inicio'),
          outOfLimit: true,
          severity: 'plan',
        },
        {
          key: 'not-filtered',
          text: both('Not filtered this shift', 'No se filtró en este turno'),
        },
      ],
    },
  ],
};
