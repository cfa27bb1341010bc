export class Failure extends Error {}
export function failureOf(what: string, output: unknown, log?: string): Failure;
