/** What a step asks for: a tick, a number, one of several answers, some words, a picture. */
export const stepKinds = ['check', 'number', 'choice', 'text', 'photo'] as const;

export type StepKind = (typeof stepKinds)[number];

/** Replaceable parts of a unit that a step can speak about. */
export const componentKinds = ['pump', 'motor', 'pan', 'hose'] as const;

export type ComponentKind = (typeof componentKinds)[number];

/** Limits that come from the unit's own motor instead of the procedure; see `limitOf`. */
export const limitSources = ['nameplate-amps', 'nameplate-volts'] as const;

export type LimitSource = (typeof limitSources)[number];
