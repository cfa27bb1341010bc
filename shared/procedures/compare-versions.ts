import type { ProcedureContent, ProcedureStep } from './procedure-content';

/** One difference between two versions. Values are shown as they stand; null is "not there". */
export interface VersionChange {
  /** `title`, `minutes`, `cautions`, `steps` … */
  readonly part: keyof ProcedureContent;
  readonly kind: 'added' | 'removed' | 'changed' | 'moved';
  /** The step's key where the part is `steps`. */
  readonly step: string | null;
  /** What of the step changed: `text`, `number` … */
  readonly field: string | null;
  readonly before: unknown;
  readonly after: unknown;
}

/**
 * What changed from one version to the next, in the order in which a reader meets it. Steps are
 * matched by key: one that stands elsewhere relative to its fellows has moved.
 */
export function compareVersions(from: ProcedureContent, to: ProcedureContent): VersionChange[] {
  const changes: VersionChange[] = [];
  for (const part of ['title', 'purpose', 'minutes'] as const) {
    if (!same(from[part], to[part])) {
      changes.push(change(part, 'changed', from[part], to[part]));
    }
  }
  for (const part of ['tools', 'parts', 'cautions'] as const) {
    const [before, after] = [from[part], to[part]];
    for (const item of before) {
      if (!after.some((it) => same(it, item))) changes.push(change(part, 'removed', item, null));
    }
    for (const item of after) {
      if (!before.some((it) => same(it, item))) changes.push(change(part, 'added', null, item));
    }
  }
  return [...changes, ...stepChanges(from.steps, to.steps)];
}

function stepChanges(
  from: readonly ProcedureStep[],
  to: readonly ProcedureStep[],
): VersionChange[] {
  const before = new Map(from.map((step) => [step.key, step]));
  const after = new Map(to.map((step) => [step.key, step]));
  const shared = from.map(({ key }) => key).filter((key) => after.has(key));
  const sharedNow = to.map(({ key }) => key).filter((key) => before.has(key));
  const stayed = longestCommon(shared, sharedNow);
  const changes: VersionChange[] = [];
  for (const step of from) {
    if (!after.has(step.key)) changes.push(change('steps', 'removed', step, null, step.key));
  }
  for (const step of to) {
    const old = before.get(step.key);
    if (!old) {
      changes.push(change('steps', 'added', null, step, step.key));
      continue;
    }
    if (!stayed.has(step.key)) {
      changes.push(change('steps', 'moved', from.indexOf(old) + 1, to.indexOf(step) + 1, step.key));
    }
    const [a, b] = [old as Record<string, unknown>, step as Record<string, unknown>];
    for (const field of new Set([...Object.keys(a), ...Object.keys(b)])) {
      if (!same(a[field], b[field])) {
        changes.push(
          change('steps', 'changed', a[field] ?? null, b[field] ?? null, step.key, field),
        );
      }
    }
  }
  return changes;
}

/** The keys that keep their order: a longest common subsequence. Lists are at most 60 long. */
function longestCommon(a: readonly string[], b: readonly string[]): Set<string> {
  const lengths = Array.from({ length: a.length + 1 }, () =>
    new Array<number>(b.length + 1).fill(0),
  );
  const at = (i: number, j: number) => lengths[i]?.[j] ?? 0;
  for (let i = a.length - 1; i >= 0; i--) {
    for (let j = b.length - 1; j >= 0; j--) {
      const row = lengths[i] as number[];
      row[j] = a[i] === b[j] ? at(i + 1, j + 1) + 1 : Math.max(at(i + 1, j), at(i, j + 1));
    }
  }
  const kept = new Set<string>();
  let [i, j] = [0, 0];
  while (i < a.length && j < b.length) {
    if (a[i] === b[j]) {
      kept.add(a[i] as string);
      i++;
      j++;
    } else if (at(i + 1, j) >= at(i, j + 1)) i++;
    else j++;
  }
  return kept;
}

function change(
  part: keyof ProcedureContent,
  kind: VersionChange['kind'],
  before: unknown,
  after: unknown,
  step: string | null = null,
  field: string | null = null,
): VersionChange {
  return { part, kind, step, field, before, after };
}

/** Equal as JSON, whatever the order of the fields. */
function same(a: unknown, b: unknown): boolean {
  return canonical(a) === canonical(b);
}

function canonical(value: unknown): string {
  return (
    JSON.stringify(value, (_key, it: unknown) =>
      it && typeof it === 'object' && !Array.isArray(it)
        ? Object.fromEntries(Object.entries(it).sort(([x], [y]) => (x < y ? -1 : 1)))
        : it,
    ) ?? ''
  );
}
