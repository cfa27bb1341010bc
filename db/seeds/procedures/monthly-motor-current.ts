import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil, liveWork, lockedOut } from './common-texts';

/** For the technician, monthly: volts and amperes under load against the nameplate, the overload. */
export const monthlyMotorCurrent: ProcedureContent = {
  title: both('Motor current and overload, monthly', 'Corriente del motor y protección, mensual'),
  purpose: both(
    'A motor that draws more than its nameplate says so before it stops: thick oil, debris in the rotors, low voltage or worn bearings.',
    'Un motor que consume más que su placa avisa antes de pararse: aceite espeso, residuos en los rotores, bajo voltaje o rodamientos gastados.',
  ),
  minutes: 15,
  tools: [
    both('True-RMS clamp meter', 'Pinza amperimétrica de valor eficaz real'),
    both('Probe thermometer', 'Termómetro de sonda'),
    both('Soft brush', 'Cepillo suave'),
  ],
  parts: [],
  cautions: [hotOil, adultsOnly, liveWork, lockedOut],
  steps: [
    {
      kind: 'check',
      key: 'vents-clear',
      text: both(
        'Power off: motor wiped, vents clear, no oil on it',
        'Sin energía: motor limpio, ventilación libre, sin aceite encima',
      ),
      caution: lockedOut,
      required: true,
      component: 'motor',
      cause: 'hardened-oil-in-motor',
      severity: 'watch',
    },
    {
      kind: 'number',
      key: 'oil-temperature',
      text: both('Oil temperature at the time of measuring', 'Temperatura del aceite al medir'),
      help: both(
        'Measured cold, the current means nothing.',
        'Medida en frío, la corriente no dice nada.',
      ),
      required: true,
      number: {
        unit: '°F',
        low: 330,
        high: 375,
        basis: both(
          'Usual filtering range in the trade; the maker’s manual decides.',
          'Rango usual de filtrado en el oficio; el manual del fabricante decide.',
        ),
      },
    },
    {
      kind: 'number',
      key: 'running-volts',
      text: both(
        'Volts at the motor, running under load',
        'Voltios en el motor, en marcha con carga',
      ),
      caution: liveWork,
      required: true,
      component: 'motor',
      cause: 'low-voltage',
      severity: 'plan',
      number: {
        unit: 'V',
        limitFrom: 'nameplate-volts',
        basis: both(
          'Nameplate volts ±10 %, NEMA MG 1-12.44.',
          'Voltaje de placa ±10 %, NEMA MG 1-12.44.',
        ),
      },
    },
    {
      kind: 'number',
      key: 'running-amps',
      text: both(
        'Amperes of one conductor, running under load',
        'Amperios de un conductor, en marcha con carga',
      ),
      caution: liveWork,
      help: both(
        'Clamp one conductor only. At ten per cent low voltage, expect about eleven per cent more current.',
        'Abrace un solo conductor. Con diez por ciento menos de voltaje, espere cerca de once por ciento más de corriente.',
      ),
      required: true,
      component: 'motor',
      cause: 'debris-in-rotors',
      severity: 'plan',
      number: {
        unit: 'A',
        limitFrom: 'nameplate-amps',
        basis: both(
          'Full-load amperes on the motor’s own nameplate, NEC 430.6(A).',
          'Amperios a plena carga de la placa del propio motor, NEC 430.6(A).',
        ),
      },
    },
    {
      kind: 'choice',
      key: 'overload-trips',
      text: both(
        'Overload trips since the last visit, as the store tells',
        'Disparos de la protección desde la última visita, según la tienda',
      ),
      help: both(
        'Rule of thumb for a trip: switch off, wait until the motor is cool (15–45 minutes), oil hot, pan seated, paper clean, reset once. A second trip is a service call. Common practice.',
        'Regla práctica ante un disparo: apague, espere a que el motor se enfríe (15–45 minutos), aceite caliente, bandeja asentada, papel limpio, restablezca una vez. Un segundo disparo es llamada a servicio. Práctica común.',
      ),
      required: true,
      component: 'motor',
      cause: 'debris-in-rotors',
      choices: [
        { key: 'none', text: both('None', 'Ninguno') },
        { key: 'one', text: both('One, explained', 'Uno, explicado') },
        {
          key: 'more',
          text: both('More than one, or one unexplained', 'Más de uno, o uno sin explicación'),
          outOfLimit: true,
          severity: 'plan',
        },
      ],
    },
    {
      kind: 'choice',
      key: 'sound',
      text: both('Sound of the motor', 'Sonido del motor'),
      required: true,
      component: 'motor',
      cause: 'bearing',
      choices: [
        { key: 'even', text: both('Even', 'Parejo') },
        {
          key: 'bearing',
          text: both('Rough or grinding', 'Áspero o rechinante'),
          outOfLimit: true,
          severity: 'plan',
        },
        {
          key: 'hum',
          text: both('Hums without turning', 'Zumba sin girar'),
          outOfLimit: true,
          cause: 'start-switch',
          severity: 'stop',
        },
      ],
    },
  ],
};
