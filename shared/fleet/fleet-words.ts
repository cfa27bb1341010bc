/** One fryer filtration system, or a portable filter. */
export const unitKinds = ['built-in', 'portable'] as const;
export type UnitKind = (typeof unitKinds)[number];

/** Replaceable parts of a unit with a life of their own. */
export const componentKinds = ['pump', 'motor', 'pan', 'hose'] as const;
export type ComponentKind = (typeof componentKinds)[number];

/** How a worn shaft seal shows on the pump's face: oil at a drain slot, or nothing but a gasket. */
export const pumpFaces = ['drain-slot', 'gasket'] as const;
export type PumpFace = (typeof pumpFaces)[number];

/** A unit has one of each of these at a time; of hoses it may have several. */
export const singleComponents: readonly ComponentKind[] = ['pump', 'motor', 'pan'];

/** In use, taken out of use, or both. */
export const standings = ['live', 'retired', 'all'] as const;
export type Standing = (typeof standings)[number];

/** Why a part came off a unit, beside the causes of findings. */
export const removalReasons = ['precaution', 'unit-refit', 'wrong-part'] as const;
export type RemovalReason = (typeof removalReasons)[number];

type Words = Readonly<Record<'en' | 'es', string>>;

export const unitKindWords: Readonly<Record<UnitKind, Words>> = {
  'built-in': { en: 'Built-in filter', es: 'Filtro integrado' },
  portable: { en: 'Portable filter', es: 'Filtro portátil' },
};

export const componentKindWords: Readonly<Record<ComponentKind, Words>> = {
  pump: { en: 'Filter pump', es: 'Bomba de filtrado' },
  motor: { en: 'Motor', es: 'Motor' },
  pan: { en: 'Filter pan', es: 'Bandeja de filtrado' },
  hose: { en: 'Hose', es: 'Manguera' },
};

export const pumpFaceWords: Readonly<Record<PumpFace, Words>> = {
  'drain-slot': { en: 'Drain slot', es: 'Ranura de drenaje' },
  gasket: { en: 'Gasket', es: 'Junta' },
};

export const removalReasonWords: Readonly<Record<RemovalReason, Words>> = {
  precaution: { en: 'As a precaution, no fault shown', es: 'Por precaución, sin falla comprobada' },
  'unit-refit': { en: 'Refit of the unit', es: 'Renovación del equipo' },
  'wrong-part': { en: 'Wrong part was fitted', es: 'Se había instalado la pieza equivocada' },
};
