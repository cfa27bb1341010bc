import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil, keepDry } from './common-texts';

/** For the store: the vat boiled out with the filter kept apart from it. */
export const boilOutIsolated: ProcedureContent = {
  title: both('Boil-out with the filter isolated', 'Hervido de limpieza con el filtro aislado'),
  purpose: both(
    'Boiling out cleans the vat. Done with the filter still connected, it is the commonest way to ruin a pump.',
    'El hervido limpia la tina. Hecho con el filtro conectado, es la forma más común de arruinar una bomba.',
  ),
  minutes: 90,
  tools: [
    both(
      'Gloves, apron and face shield for hot oil and for cleaner',
      'Guantes, delantal y careta para aceite caliente y limpiador',
    ),
    both('Long-handled brush', 'Cepillo de mango largo'),
    both('pH strips', 'Tiras de pH'),
    both('Drain pail rated for hot water', 'Cubeta apta para agua caliente'),
  ],
  parts: [
    both(
      'Fryer cleaner, vinegar or citric rinse',
      'Limpiador de freidoras, enjuague de vinagre o cítrico',
    ),
  ],
  cautions: [
    hotOil,
    adultsOnly,
    keepDry,
    both(
      'Fryer cleaner is caustic. Follow its safety sheet; eyes and skin covered; know where the eyewash is.',
      'El limpiador de freidoras es cáustico. Siga su hoja de seguridad; ojos y piel cubiertos; sepa dónde está el lavaojos.',
    ),
  ],
  steps: [
    {
      kind: 'check',
      key: 'filter-apart',
      text: both(
        'Filter pump off and unplugged or locked, its valves closed, pan pulled out and set aside dry',
        'Bomba del filtro apagada y desenchufada o bloqueada, válvulas cerradas, bandeja fuera y seca aparte',
      ),
      caution: keepDry,
      required: true,
    },
    {
      kind: 'number',
      key: 'vat-temperature',
      text: both(
        'Temperature of the emptied vat before water goes in',
        'Temperatura de la tina vacía antes de poner agua',
      ),
      caution: both(
        'Water on a hot vat flashes to steam, and cold water can crack a weld. Let it cool.',
        'El agua en una tina caliente se vuelve vapor, y el agua fría puede agrietar una soldadura. Déjela enfriar.',
      ),
      required: true,
      number: {
        unit: '°F',
        high: 150,
        basis: both(
          'Starting value; the makers of fryer and cleaner decide.',
          'Valor inicial; deciden los fabricantes de la freidora y del limpiador.',
        ),
      },
    },
    {
      kind: 'number',
      key: 'boil-minutes',
      text: both(
        'Minutes of gentle boil, somebody standing by',
        'Minutos de hervor suave, con alguien presente',
      ),
      caution: both(
        'Never leave it: it foams over. Heat down at the first rise.',
        'Nunca la deje sola: se derrama al espumar. Baje el calor en cuanto suba.',
      ),
      required: true,
      number: {
        unit: 'min',
        low: 20,
        high: 30,
        basis: both(
          'Usual in the trade; the cleaner’s label decides.',
          'Usual en el oficio; la etiqueta del limpiador decide.',
        ),
      },
    },
    {
      kind: 'check',
      key: 'drained-by-hand',
      text: both(
        'Cooled, then drained to a pail or floor drain, not one drop through the filter pump',
        'Enfriada y luego drenada a cubeta o coladera, ni una gota por la bomba del filtro',
      ),
      required: true,
      component: 'pump',
      cause: 'water-corrosion',
      severity: 'stop',
    },
    {
      kind: 'choice',
      key: 'ph',
      text: both('pH of the last rinse', 'pH del último enjuague'),
      help: both(
        'Rinse with vinegar or citric water until neutral: cleaner left behind spoils the next oil and the seal.',
        'Enjuague con agua y vinagre o cítrico hasta que esté neutro: el limpiador que queda arruina el aceite nuevo y el sello.',
      ),
      required: true,
      choices: [
        { key: 'neutral', text: both('Neutral', 'Neutro') },
        {
          key: 'not-neutral',
          text: both('Not neutral: rinsing again', 'No neutro: se enjuaga otra vez'),
          outOfLimit: true,
        },
      ],
    },
    {
      kind: 'check',
      key: 'all-dry',
      text: both(
        'Vat, drain valve and line wiped bone dry before oil goes in and the filter is connected',
        'Tina, válvula y línea de drenaje totalmente secas antes de poner aceite y conectar el filtro',
      ),
      caution: both(
        'Water under hot oil erupts. Look again before you fill.',
        'El agua bajo aceite caliente hace erupción. Mire otra vez antes de llenar.',
      ),
      required: true,
      component: 'pump',
      cause: 'water-corrosion',
      severity: 'stop',
    },
  ],
};
