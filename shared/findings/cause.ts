/** What was at the bottom of a finding or a repair. Codes are stored; the words are for people. */
export const causes = [
  'worn-seal',
  'debris-in-rotors',
  'water-corrosion',
  'hardened-oil-in-motor',
  'clogged-paper',
  'o-ring-leak',
  'solid-fat',
  'low-voltage',
  'start-switch',
  'capacitor',
  'winding',
  'bearing',
  'coupling',
  'hose-damage',
  'cord-damage',
  'pan-damage',
  'other',
] as const;

export type Cause = (typeof causes)[number];

/** How urgent a finding is: keep an eye on it, plan a repair, stop using the unit. */
export const severities = ['watch', 'plan', 'stop'] as const;

export type Severity = (typeof severities)[number];

export const causeWords: Readonly<Record<Cause, Readonly<Record<'en' | 'es', string>>>> = {
  'worn-seal': { en: 'Worn shaft seal', es: 'Sello del eje gastado' },
  'debris-in-rotors': { en: 'Debris between the rotors', es: 'Residuos entre los rotores' },
  'water-corrosion': { en: 'Corrosion from water', es: 'Corrosión por agua' },
  'hardened-oil-in-motor': {
    en: 'Hardened oil in the motor',
    es: 'Aceite endurecido dentro del motor',
  },
  'clogged-paper': {
    en: 'Clogged or badly seated paper',
    es: 'Papel filtro obstruido o mal colocado',
  },
  'o-ring-leak': { en: 'O-ring leaking air', es: 'Entrada de aire por el O-ring' },
  'solid-fat': { en: 'Solid fat in pan or lines', es: 'Grasa sólida en la bandeja o las líneas' },
  'low-voltage': { en: 'Voltage out of range', es: 'Voltaje fuera de rango' },
  'start-switch': { en: 'Start switch', es: 'Interruptor de arranque' },
  capacitor: { en: 'Capacitor', es: 'Capacitor' },
  winding: { en: 'Motor winding', es: 'Devanado del motor' },
  bearing: { en: 'Motor bearing', es: 'Rodamiento del motor' },
  coupling: { en: 'Coupling or tang', es: 'Acople o lengüeta' },
  'hose-damage': { en: 'Damaged hose', es: 'Manguera dañada' },
  'cord-damage': { en: 'Damaged cord or plug', es: 'Cable o enchufe dañado' },
  'pan-damage': { en: 'Damaged pan or screen', es: 'Bandeja o malla dañada' },
  other: { en: 'Something else', es: 'Otra causa' },
};

export const severityWords: Readonly<Record<Severity, Readonly<Record<'en' | 'es', string>>>> = {
  watch: { en: 'Watch', es: 'Vigilar' },
  plan: { en: 'Plan a repair', es: 'Programar una reparación' },
  stop: { en: 'Stop using it', es: 'Dejar de usar' },
};
