import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil, lockedOut, startingValue } from './common-texts';

/** For the technician, monthly: the shaft seal, judged at the drain slot of the pump's face. */
export const monthlySealCheck: ProcedureContent = {
  title: both(
    'Pump seal at the drain slot, monthly',
    'Sello de la bomba en la ranura de drenaje, mensual',
  ),
  purpose: both(
    'A seal weeps long before it fails. Seen at the drain slot it costs a seal; unseen it can cost the motor.',
    'Un sello gotea mucho antes de fallar. Visto en la ranura de drenaje cuesta un sello; sin verlo puede costar el motor.',
  ),
  minutes: 10,
  tools: [
    both('Flashlight and mirror', 'Linterna y espejo'),
    both('White paper towel', 'Toalla de papel blanca'),
    both('Wooden or plastic pick', 'Palillo de madera o plástico'),
  ],
  parts: [both('Seal kit for the pump', 'Juego de sellos de la bomba')],
  cautions: [hotOil, adultsOnly, lockedOut],
  steps: [
    {
      kind: 'check',
      key: 'slot-open',
      text: both(
        'Drain slot open: cleared, never plugged',
        'Ranura de drenaje abierta: despejada, nunca tapada',
      ),
      caution: both(
        'Power off and locked while your hand is near the coupling. Use a pick, not a finger.',
        'Energía cortada y bloqueada mientras su mano esté cerca del acople. Use un palillo, no el dedo.',
      ),
      help: both(
        'The slot lets a weep out where it can be seen. Plugged, it sends the oil into the motor, where it sets hard.',
        'La ranura deja salir el goteo donde se ve. Tapada, manda el aceite al motor, donde se endurece.',
      ),
      required: true,
      component: 'pump',
      cause: 'worn-seal',
      severity: 'plan',
    },
    {
      kind: 'choice',
      key: 'slot-state',
      text: both(
        'What the slot shows on a clean towel',
        'Qué muestra la ranura en una toalla limpia',
      ),
      required: true,
      component: 'pump',
      cause: 'worn-seal',
      choices: [
        { key: 'dry', text: both('Dry', 'Seca') },
        { key: 'trace', text: both('A trace', 'Un rastro') },
        {
          key: 'wet',
          text: both('Wet, or dripping', 'Mojada o goteando'),
          outOfLimit: true,
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'number',
      key: 'drops-per-minute',
      text: both(
        'Drops in one minute with the pump running hot',
        'Gotas en un minuto con la bomba caliente en marcha',
      ),
      caution: both(
        'Guards on, hands and sleeves clear: the shaft turns and the oil is hot.',
        'Protecciones puestas, manos y mangas fuera: el eje gira y el aceite está caliente.',
      ),
      required: true,
      component: 'pump',
      cause: 'worn-seal',
      severity: 'plan',
      number: { unit: 'drops/min', low: 0, high: 0, basis: startingValue },
    },
    {
      kind: 'choice',
      key: 'shaft-colour',
      text: both('Shaft just outside the seal', 'El eje justo fuera del sello'),
      required: true,
      component: 'pump',
      cause: 'worn-seal',
      choices: [
        { key: 'bright', text: both('Bright', 'Brillante') },
        {
          key: 'discoloured',
          text: both('Discoloured', 'Descolorido'),
          outOfLimit: true,
          severity: 'watch',
        },
        {
          key: 'rust',
          text: both('Rust', 'Óxido'),
          outOfLimit: true,
          cause: 'water-corrosion',
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'check',
      key: 'motor-face-dry',
      text: both(
        'No oil tracks down the motor’s face',
        'Sin rastros de aceite en la cara del motor',
      ),
      required: true,
      component: 'motor',
      cause: 'hardened-oil-in-motor',
      severity: 'plan',
    },
    {
      kind: 'photo',
      key: 'slot-photo',
      text: both('Photo of slot and shaft', 'Foto de la ranura y el eje'),
      required: true,
    },
  ],
};
