/** What one row of a file can be about. */
export const importKinds = ['chains', 'regions', 'stores', 'units', 'components'] as const;
export type ImportKind = (typeof importKinds)[number];

/** How dates with slashes are to be read; dates written 2026-05-31 are understood in any case. */
export const dateOrders = ['mdy', 'dmy'] as const;
export type DateOrder = (typeof dateOrders)[number];

interface FieldWords {
  readonly en: string;
  readonly es: string;
  /** Other headings under which people keep it, in either language. */
  readonly also: readonly string[];
}

/**
 * Everything that a column of a file can hold, with its heading in exports and templates, and the
 * other headings it is recognised by. `unit…` is about the unit, `part…` about a row's own part, the
 * rest about the parts of a row's unit.
 */
export const importFields = {
  chain: { en: 'Chain', es: 'Cadena', also: ['brand', 'banner', 'concept', 'marca'] },
  region: { en: 'Region', es: 'Región', also: ['area', 'district', 'territory', 'zona', 'área'] },
  storeNumber: {
    en: 'Store number',
    es: 'Número de local',
    also: [
      'store',
      'store no',
      'store id',
      'store nbr',
      'number',
      'site',
      'site number',
      'restaurant number',
      'local',
      'tienda',
      'n de local',
      'número de tienda',
      'no de tienda',
      'código de local',
    ],
  },
  storeName: {
    en: 'Store name',
    es: 'Nombre del local',
    also: ['name', 'site name', 'restaurant', 'nombre', 'nombre de la tienda', 'tienda nombre'],
  },
  addressLine: {
    en: 'Address',
    es: 'Dirección',
    also: ['street', 'street address', 'address 1', 'address line', 'calle', 'domicilio'],
  },
  city: { en: 'City', es: 'Ciudad', also: ['town', 'localidad', 'municipio', 'población'] },
  usState: { en: 'State', es: 'Estado', also: ['st', 'state code', 'province', 'provincia'] },
  postalCode: {
    en: 'ZIP code',
    es: 'Código postal',
    also: ['zip', 'postal code', 'postcode', 'cp', 'c p', 'código zip'],
  },
  latitude: { en: 'Latitude', es: 'Latitud', also: ['lat'] },
  longitude: { en: 'Longitude', es: 'Longitud', also: ['lon', 'lng', 'long'] },
  timeZone: {
    en: 'Time zone',
    es: 'Zona horaria',
    also: ['timezone', 'tz', 'huso horario', 'huso'],
  },
  phone: { en: 'Phone', es: 'Teléfono', also: ['telephone', 'tel', 'phone number', 'celular'] },
  accessNote: {
    en: 'Access note',
    es: 'Nota de acceso',
    also: ['access', 'how to get in', 'acceso', 'cómo entrar'],
  },
  opens: {
    en: 'Opens',
    es: 'Abre',
    also: ['open', 'opening time', 'apertura', 'hora de apertura'],
  },
  closes: {
    en: 'Closes',
    es: 'Cierra',
    also: ['close', 'closing time', 'cierre', 'hora de cierre'],
  },
  rush: {
    en: 'Rush hours',
    es: 'Horas pico',
    also: ['rush', 'rush windows', 'peak hours', 'hora pico', 'horas punta'],
  },
  unitTag: {
    en: 'Unit',
    es: 'Equipo',
    also: [
      'unit tag',
      'tag',
      'asset tag',
      'asset',
      'equipment',
      'equipment tag',
      'fryer',
      'etiqueta',
      'etiqueta del equipo',
      'freidora',
      'unidad',
    ],
  },
  unitKind: {
    en: 'Kind of unit',
    es: 'Tipo de equipo',
    also: ['unit kind', 'unit type', 'kind', 'type', 'equipment type', 'tipo'],
  },
  vats: {
    en: 'Vats',
    es: 'Tinas',
    also: ['number of vats', 'vat count', 'wells', 'cubas', 'número de tinas', 'número de cubas'],
  },
  oilPounds: {
    en: 'Oil (lb)',
    es: 'Aceite (lb)',
    also: ['oil', 'oil pounds', 'oil lb', 'oil volume', 'aceite', 'aceite libras'],
  },
  unitModel: {
    en: 'Model',
    es: 'Modelo',
    also: ['unit model', 'fryer model', 'modelo del equipo', 'modelo de la freidora'],
  },
  unitInstalledOn: {
    en: 'Installed on',
    es: 'Instalado el',
    also: [
      'unit installed on',
      'installed',
      'install date',
      'installation date',
      'date installed',
      'fecha de instalación',
      'instalación',
    ],
  },
  outOfServiceSince: {
    en: 'Out of service since',
    es: 'Fuera de servicio desde',
    also: ['out of service', 'fuera de servicio'],
  },
  pumpSerial: {
    en: 'Pump serial number',
    es: 'Serie de la bomba',
    also: partWords('pump', 'bomba'),
  },
  pumpModel: {
    en: 'Pump model',
    es: 'Modelo de la bomba',
    also: ['filter pump model', 'modelo bomba'],
  },
  pumpFace: {
    en: 'Pump face',
    es: 'Cara de la bomba',
    also: ['drain slot or gasket', 'ranura o junta', 'pump seal face'],
  },
  pumpInstalledOn: {
    en: 'Pump installed on',
    es: 'Bomba instalada el',
    also: ['pump installed', 'pump install date', 'fecha bomba', 'instalación de la bomba'],
  },
  motorSerial: {
    en: 'Motor serial number',
    es: 'Serie del motor',
    also: partWords('motor', 'motor'),
  },
  motorModel: { en: 'Motor model', es: 'Modelo del motor', also: ['modelo motor'] },
  motorInstalledOn: {
    en: 'Motor installed on',
    es: 'Motor instalado el',
    also: ['motor installed', 'motor install date', 'fecha motor', 'instalación del motor'],
  },
  volts: { en: 'Volts', es: 'Voltios', also: ['v', 'voltage', 'rated voltage', 'voltaje', 'volt'] },
  amps: {
    en: 'Amps',
    es: 'Amperios',
    also: ['a', 'fla', 'full load amps', 'rated current', 'amperaje', 'corriente', 'amp'],
  },
  horsepower: { en: 'Horsepower', es: 'Caballos', also: ['hp', 'cv', 'caballos de fuerza'] },
  phase: { en: 'Phases', es: 'Fases', also: ['phase', 'ph', 'fase'] },
  rpm: { en: 'Speed (rpm)', es: 'Velocidad (rpm)', also: ['rpm', 'speed', 'velocidad'] },
  panSerial: {
    en: 'Pan serial number',
    es: 'Serie de la bandeja',
    also: partWords('pan', 'bandeja'),
  },
  panInstalledOn: {
    en: 'Pan installed on',
    es: 'Bandeja instalada el',
    also: ['pan installed', 'instalación de la bandeja'],
  },
  hoseSerial: {
    en: 'Hose serial number',
    es: 'Serie de la manguera',
    also: partWords('hose', 'manguera'),
  },
  hoseInstalledOn: {
    en: 'Hose installed on',
    es: 'Manguera instalada el',
    also: ['hose installed', 'instalación de la manguera'],
  },
  partKind: {
    en: 'Part',
    es: 'Pieza',
    also: ['component', 'part type', 'component type', 'componente', 'tipo de pieza'],
  },
  partSerial: {
    en: 'Serial number',
    es: 'Número de serie',
    also: ['serial', 'serial no', 's n', 'serie', 'n de serie', 'no de serie'],
  },
  partModel: {
    en: 'Part model',
    es: 'Modelo de la pieza',
    also: ['model', 'component model', 'modelo'],
  },
  partFace: {
    en: 'Face',
    es: 'Cara',
    also: ['pump face', 'cara de la bomba', 'drain slot or gasket', 'ranura o junta'],
  },
  partInstalledOn: {
    en: 'Part installed on',
    es: 'Pieza instalada el',
    also: ['installed on', 'installed', 'install date', 'date installed', 'fecha de instalación'],
  },
} as const satisfies Readonly<Record<string, FieldWords>>;

export type ImportField = keyof typeof importFields;
export const importFieldNames = Object.keys(importFields) as [ImportField, ...ImportField[]];

function partWords(en: string, es: string): readonly string[] {
  return [`${en} serial`, `${en} serial no`, `serie ${es}`, `número de serie ${es}`];
}

const groups = ['chain', 'region'] as const;
const ofStore = [
  'storeName',
  'addressLine',
  'city',
  'usState',
  'postalCode',
  'latitude',
  'longitude',
  'timeZone',
  'phone',
  'accessNote',
  'opens',
  'closes',
  'rush',
] as const;
const plate = ['volts', 'amps', 'horsepower', 'phase', 'rpm'] as const;

/** The fields that a file of each kind can hold, in the order of templates. */
export const fieldsOf: Readonly<Record<ImportKind, readonly ImportField[]>> = {
  chains: ['chain'],
  regions: ['region'],
  stores: [...groups, 'storeNumber', ...ofStore],
  units: [
    ...groups,
    'storeNumber',
    'unitTag',
    'unitKind',
    'vats',
    'oilPounds',
    'unitModel',
    'unitInstalledOn',
    'outOfServiceSince',
    'pumpSerial',
    'pumpModel',
    'pumpFace',
    'pumpInstalledOn',
    'motorSerial',
    'motorModel',
    'motorInstalledOn',
    ...plate,
    'panSerial',
    'panInstalledOn',
    'hoseSerial',
    'hoseInstalledOn',
    ...ofStore,
  ],
  components: [
    'chain',
    'storeNumber',
    'unitTag',
    'partKind',
    'partSerial',
    'partModel',
    'partFace',
    'partInstalledOn',
    ...plate,
  ],
};

/** Fields without whose column a file of this kind cannot be read at all. */
export const neededFields: Readonly<Record<ImportKind, readonly ImportField[]>> = {
  chains: ['chain'],
  regions: ['region'],
  stores: ['storeNumber'],
  units: ['storeNumber', 'unitTag'],
  components: ['storeNumber', 'unitTag', 'partKind'],
};
