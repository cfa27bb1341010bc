import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { adultsOnly, both, hotOil, liveWork, lockedOut } from './common-texts';

/** For the technician, yearly: what carries current and what carries hot oil. */
export const annualElectricalHose: ProcedureContent = {
  title: both('Electrical and hoses, annual', 'Sistema eléctrico y mangueras, anual'),
  purpose: both(
    'Cords, terminals, windings and hoses age with heat and oil. Once a year each is looked at and measured, and what is doubtful is replaced.',
    'Cables, terminales, devanados y mangueras envejecen con el calor y el aceite. Una vez al año se revisa y mide cada uno, y lo dudoso se cambia.',
  ),
  minutes: 50,
  tools: [
    both('Lockout kit and voltage tester', 'Juego de bloqueo y probador de tensión'),
    both('500 V insulation tester', 'Medidor de aislamiento de 500 V'),
    both('Insulated screwdrivers', 'Destornilladores aislados'),
    both(
      'Resistor lead for discharging capacitors',
      'Punta con resistencia para descargar capacitores',
    ),
  ],
  parts: [
    both('Hose and food-grade O-rings', 'Manguera y O-rings de grado alimenticio'),
    both('Capacitor of the same rating', 'Capacitor del mismo valor'),
  ],
  cautions: [
    hotOil,
    adultsOnly,
    lockedOut,
    both(
      'A capacitor holds its charge after the power is gone. Discharge it through a resistor and prove it before touching a terminal.',
      'Un capacitor conserva su carga sin energía. Descárguelo con una resistencia y compruébelo antes de tocar un terminal.',
    ),
  ],
  steps: [
    {
      kind: 'check',
      key: 'locked-out',
      text: both(
        'Locked out, tagged, proved dead, capacitor discharged',
        'Bloqueado, etiquetado, sin tensión comprobada y capacitor descargado',
      ),
      caution: lockedOut,
      required: true,
    },
    {
      kind: 'choice',
      key: 'cord-plug',
      text: both(
        'Cord, plug, strain relief and earth conductor',
        'Cable, enchufe, sujeción y conductor de tierra',
      ),
      required: true,
      component: 'motor',
      cause: 'cord-damage',
      choices: [
        {
          key: 'sound',
          text: both(
            'No cuts, no heat marks, earth continuous',
            'Sin cortes ni marcas de calor, tierra continua',
          ),
        },
        {
          key: 'worn',
          text: both('Worn: to be replaced', 'Gastado: por cambiar'),
          outOfLimit: true,
          severity: 'plan',
        },
        {
          key: 'bare',
          text: both('Cut, bare or burnt', 'Cortado, pelado o quemado'),
          outOfLimit: true,
          severity: 'stop',
        },
      ],
    },
    {
      kind: 'check',
      key: 'terminals',
      text: both(
        'Terminal box: every connection tight and in its place, no oil inside',
        'Caja de terminales: cada conexión firme y en su lugar, sin aceite adentro',
      ),
      required: true,
      component: 'motor',
      cause: 'hardened-oil-in-motor',
      severity: 'plan',
    },
    {
      kind: 'number',
      key: 'insulation',
      text: both(
        'Insulation resistance to earth, 500 V DC, one minute',
        'Resistencia de aislamiento a tierra, 500 V CC, un minuto',
      ),
      caution: both(
        'The tester puts 500 V on the winding. Nobody else touches the machine; discharge it afterwards.',
        'El medidor aplica 500 V al devanado. Nadie más toca la máquina; descárguela después.',
      ),
      required: true,
      component: 'motor',
      cause: 'winding',
      severity: 'stop',
      number: {
        unit: 'MΩ',
        low: 5,
        basis: both(
          'By analogy only: IEEE 43-2013 asks 5 MΩ of random-wound machines below 1 kV, but leaves out fractional-horsepower motors.',
          'Solo por analogía: IEEE 43-2013 pide 5 MΩ a máquinas de devanado al azar de menos de 1 kV, pero excluye motores fraccionarios.',
        ),
      },
    },
    {
      kind: 'choice',
      key: 'windings',
      text: both('Windings, as far as they can be seen', 'Devanados, hasta donde se ven'),
      required: true,
      component: 'motor',
      cause: 'winding',
      choices: [
        { key: 'even', text: both('One even colour', 'Un solo color parejo') },
        {
          key: 'one-brown',
          text: both('One of them browned', 'Uno de ellos oscurecido'),
          outOfLimit: true,
          severity: 'plan',
        },
        {
          key: 'oil',
          text: both('Oil or hard fat around them', 'Aceite o grasa dura alrededor'),
          outOfLimit: true,
          cause: 'hardened-oil-in-motor',
          severity: 'stop',
        },
      ],
    },
    {
      kind: 'check',
      key: 'start-switch',
      text: both(
        'Start switch moves cleanly between its two positions; capacitor neither swollen nor leaking',
        'El interruptor de arranque se mueve limpio entre sus dos posiciones; el capacitor no está hinchado ni gotea',
      ),
      required: true,
      component: 'motor',
      cause: 'start-switch',
      severity: 'plan',
    },
    {
      kind: 'choice',
      key: 'hoses',
      text: both(
        'Hoses and fittings, along their whole length',
        'Mangueras y conexiones, en toda su longitud',
      ),
      required: true,
      component: 'hose',
      cause: 'hose-damage',
      choices: [
        { key: 'sound', text: both('Sound, dry, free of kinks', 'Sanas, secas, sin dobleces') },
        {
          key: 'stiff',
          text: both('Stiff or weeping at a fitting', 'Rígidas o con goteo en una conexión'),
          outOfLimit: true,
          severity: 'plan',
        },
        {
          key: 'cut',
          text: both('Cut, bulging or leaking', 'Cortadas, abultadas o con fuga'),
          outOfLimit: true,
          severity: 'stop',
        },
      ],
    },
    {
      kind: 'number',
      key: 'running-amps',
      text: both(
        'Closed up again: amperes running under load',
        'Cerrado otra vez: amperios en marcha con carga',
      ),
      caution: liveWork,
      required: true,
      component: 'motor',
      cause: 'bearing',
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
      kind: 'text',
      key: 'replaced',
      text: both(
        'What was replaced, and what should be next',
        'Qué se cambió y qué convendría cambiar después',
      ),
      required: false,
    },
  ],
};
