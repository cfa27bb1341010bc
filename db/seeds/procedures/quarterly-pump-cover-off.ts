import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil, keepDry, lockedOut, startingValue } from './common-texts';

/** For the technician, quarterly: the pump opened, rotors out, cleaned, closed, tried. */
export const quarterlyPumpCoverOff: ProcedureContent = {
  title: both('Pump with the cover off, quarterly', 'Bomba con la tapa abierta, trimestral'),
  purpose: both(
    'Breading and fines between the rotors lock most stuck pumps. Opened and cleaned, most of them run again, and wear is seen while it is still cheap.',
    'El empanizado y las partículas entre los rotores traban la mayoría de las bombas atascadas. Abiertas y limpias, la mayoría vuelve a andar, y el desgaste se ve cuando aún es barato.',
  ),
  minutes: 60,
  tools: [
    both('Lockout kit', 'Juego de bloqueo'),
    both('Hex keys and nut drivers', 'Llaves hexagonales y de tuerca'),
    both('Cut-resistant gloves', 'Guantes anticorte'),
    both('Nylon brush and scraper', 'Cepillo de nailon y espátula'),
    both('Drip tray and towels', 'Bandeja de goteo y toallas'),
  ],
  parts: [
    both('Cover gasket or O-ring', 'Empaque u O-ring de la tapa'),
    both('Food-grade lubricant', 'Lubricante de grado alimenticio'),
  ],
  cautions: [
    hotOil,
    adultsOnly,
    lockedOut,
    both(
      'Rotor edges can be sharp. Gloves on, and turn the pump only by hand.',
      'Los bordes de los rotores pueden cortar. Use guantes y gire la bomba solo a mano.',
    ),
    keepDry,
  ],
  steps: [
    {
      kind: 'check',
      key: 'locked-out',
      text: both(
        'Power off, locked, proved dead; lines drained; pump cool enough to hold',
        'Energía cortada, bloqueada y comprobada; líneas drenadas; bomba lo bastante fría para sostenerla',
      ),
      caution: lockedOut,
      help: both(
        'Not possible? Stop here, say why, and call someone licensed.',
        '¿No es posible? Deténgase aquí, diga por qué y llame a alguien con licencia.',
      ),
      required: true,
    },
    {
      kind: 'choice',
      key: 'found-inside',
      text: both(
        'Cover off, rotors out: what was between them',
        'Tapa y rotores fuera: qué había entre ellos',
      ),
      help: both(
        'The rotors come out without taking the rest apart. Remember which way each one faced.',
        'Los rotores salen sin desarmar lo demás. Recuerde hacia dónde miraba cada uno.',
      ),
      required: true,
      component: 'pump',
      cause: 'debris-in-rotors',
      choices: [
        { key: 'clean', text: both('Nothing but oil', 'Solo aceite') },
        {
          key: 'fines',
          text: both('Fines or soft fat, cleaned out', 'Partículas o grasa blanda, limpiadas'),
          outOfLimit: true,
          severity: 'watch',
        },
        {
          key: 'packed',
          text: both('Packed with breading', 'Llena de empanizado'),
          outOfLimit: true,
          severity: 'plan',
        },
        {
          key: 'rust',
          text: both('Rust or pitted surfaces', 'Óxido o superficies picadas'),
          outOfLimit: true,
          cause: 'water-corrosion',
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'check',
      key: 'no-scoring',
      text: both(
        'Rotors, housing and ring gear clean to the metal; no scoring to be felt with a fingernail through the glove',
        'Rotores, carcasa y corona limpios hasta el metal; sin rayas que se sientan con la uña a través del guante',
      ),
      required: true,
      component: 'pump',
      cause: 'debris-in-rotors',
      severity: 'plan',
    },
    {
      kind: 'choice',
      key: 'coupling',
      text: both(
        'Tang, slot and set screws of the coupling',
        'Lengüeta, ranura y prisioneros del acople',
      ),
      required: true,
      component: 'pump',
      cause: 'coupling',
      choices: [
        { key: 'square', text: both('Square and tight', 'Cuadrados y firmes') },
        {
          key: 'tightened',
          text: both('Set screw was loose, tightened', 'Prisionero flojo, apretado'),
        },
        {
          key: 'rounded',
          text: both('Rounded or cracked', 'Redondeados o agrietados'),
          outOfLimit: true,
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'check',
      key: 'turns-by-hand',
      text: both(
        'New gasket in, cover on, the pump turns freely by hand',
        'Empaque nuevo, tapa puesta, la bomba gira libre a mano',
      ),
      help: both(
        'Any residue left behind makes the gears bind: open it again.',
        'Cualquier residuo que quede traba los engranajes: ábrala otra vez.',
      ),
      required: true,
      component: 'pump',
      cause: 'debris-in-rotors',
      severity: 'stop',
    },
    {
      kind: 'check',
      key: 'direction',
      text: both(
        'Direction of rotation agrees with inlet, outlet and the marks on the pump',
        'El sentido de giro concuerda con la entrada, la salida y las marcas de la bomba',
      ),
      required: true,
      component: 'pump',
      cause: 'other',
      severity: 'stop',
    },
    {
      kind: 'number',
      key: 'flow-share',
      text: both(
        'Timed flow, hot, in per cent of the rated flow',
        'Flujo medido en caliente, en porcentaje del nominal',
      ),
      help: both(
        'A known volume of oil through the return by the stopwatch. Under 80 % plan a repair; under 65 % the pump is worn out. Both are starting values.',
        'Un volumen conocido de aceite por el retorno con cronómetro. Menos de 80 %, programe una reparación; menos de 65 %, la bomba está agotada. Ambos son valores iniciales.',
      ),
      required: false,
      component: 'pump',
      cause: 'debris-in-rotors',
      severity: 'plan',
      number: { unit: '%', low: 80, basis: startingValue },
    },
    {
      kind: 'photo',
      key: 'rotors-photo',
      text: both('Photo of the rotors as found', 'Foto de los rotores como se encontraron'),
      required: true,
    },
  ],
};
