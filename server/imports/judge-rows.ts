import { randomUUID } from 'node:crypto';
import { mayAt, mayEverywhere } from '@shared/access/ability';
import type { ImportKind } from '@shared/imports/import-fields';
import type { ReadRow } from '@shared/imports/read-row';
import type { Actor } from '../access/actor';
import { localDay } from '../fleet/fleet-policy';
import { type Change, type GroupColumns, type StoreColumns, same } from './fleet-records';
import type { FleetMemory, State } from './fleet-memory';
import { mergePart, saidParts } from './merge-parts';
import { disagreement, mergeStore } from './merge-store';
import { mergeUnit } from './merge-unit';
import { RowDraft } from './row-draft';

/**
 * Holds rows against the fleet, one after the other: who they are about, what they would change, and
 * what is wrong. Nothing is written here, so that the check and the import judge alike.
 */
export class RowJudge {
  private readonly today = new Map<string, string>();

  constructor(
    private readonly kind: ImportKind,
    private readonly actor: Actor,
    private readonly now: Date,
    private readonly memory: FleetMemory,
  ) {}

  judge(row: ReadRow): RowDraft {
    const draft = new RowDraft(row);
    if (this.kind === 'chains') this.ownGroup(draft, 'chain');
    else if (this.kind === 'regions') this.ownGroup(draft, 'region');
    else this.place(draft);
    if (!draft.isBad) draft.whenTaken.forEach((remember) => remember());
    return draft;
  }

  private place(draft: RowDraft): void {
    const store = this.store(draft);
    if (!store || this.kind === 'stores') return;
    const { unitTag } = draft.row.values;
    if (unitTag === undefined) return draft.need('unitTag');
    const known = this.memory.unit(store.id, unitTag);
    if (known?.retired) return draft.fault('unitTag', 'retired', unitTag);
    const today = this.dayAt(store.columns.time_zone);
    let unit = known;
    if (this.kind === 'units') {
      if (known?.row != null) return draft.fault('unitTag', 'doubled', unitTag, { row: known.row });
      unit = mergeUnit(draft, store.id, known?.columns ?? null, known?.id ?? randomUUID(), today);
      if (!unit) return;
      const made = unit;
      draft.changes.units.push(change(draft, made.id, known?.columns ?? null, made.columns));
      draft.whenTaken.push(() => this.memory.rememberUnit(made));
    }
    if (!unit) return draft.fault('unitTag', 'unit-unknown', unitTag);
    if (this.kind === 'components' && !draft.row.values.partKind) return draft.need('partKind');
    this.parts(draft, { id: unit.id, installedOn: unit.columns.installed_on }, today);
  }

  private parts(
    draft: RowDraft,
    unit: { id: string; installedOn: string | null },
    today: string,
  ): void {
    for (const said of saidParts(draft.row.values)) {
      const fitted = this.memory
        .partsOf(unit.id)
        .filter(({ columns }) => columns.kind === said.kind);
      const merged = mergePart(draft, said, unit, fitted, today);
      if (!merged) continue;
      const { part, before } = merged;
      draft.changes.components.push(change(draft, part.id, before, part.columns));
      draft.whenTaken.push(() => this.memory.rememberPart(part));
    }
  }

  private store(draft: RowDraft): State<StoreColumns> | null {
    const { values } = draft.row;
    if (values.storeNumber === undefined) draft.need('storeNumber');
    const chain = this.group(draft, 'chain');
    if (!chain || values.storeNumber === undefined) return null;
    const known = this.memory.store(chain.id, values.storeNumber);
    const bringsStore = this.kind === 'stores' || values.storeName !== undefined;
    if (!known && (this.kind === 'components' || !bringsStore)) {
      draft.fault('storeNumber', 'store-unknown', values.storeNumber);
      return null;
    }
    if (known?.retired) {
      draft.fault('storeNumber', 'retired', values.storeNumber);
      return null;
    }
    if (this.kind === 'components') return this.allowed(draft, known as State<StoreColumns>);
    const region =
      known && values.region === undefined
        ? { id: known.columns.region_id }
        : this.group(draft, 'region');
    if (known && !this.allowed(draft, known)) return null;
    if (!region) return null;
    const before = known?.columns ?? null;
    const after = mergeStore(draft, { chainId: chain.id, regionId: region.id, before });
    if (!after) return null;
    return this.settle(draft, known, after);
  }

  /** Takes a store's columns for good, unless an earlier row said otherwise. */
  private settle(
    draft: RowDraft,
    known: State<StoreColumns> | undefined,
    after: StoreColumns,
  ): State<StoreColumns> | null {
    const id = known?.id ?? randomUUID();
    if (known?.row != null) {
      if (this.kind === 'stores') {
        draft.fault('storeNumber', 'doubled', after.number, { row: known.row });
        return null;
      }
      const field = disagreement(known.columns, after);
      if (!field) return known;
      draft.fault(field, 'differs', String(draft.row.values[field] ?? ''), { row: known.row });
      return null;
    }
    const store = { id, columns: after, retired: false, row: draft.row.number };
    if (!this.allowed(draft, store)) return null;
    draft.changes.stores.push(change(draft, id, known?.columns ?? null, after));
    draft.whenTaken.push(() => this.memory.rememberStore(store));
    return store;
  }

  private allowed(draft: RowDraft, store: State<StoreColumns>): State<StoreColumns> | null {
    const { chain_id: chainId, region_id: regionId } = store.columns;
    if (mayAt('fleet.import', this.actor.grants, { chainId, regionId, storeId: store.id })) {
      return store;
    }
    draft.fault('storeNumber', 'not-yours', store.columns.number);
    return null;
  }

  /** The chain or region that a row names, made where it is new; the only one where it names none. */
  private group(draft: RowDraft, field: 'chain' | 'region'): State<GroupColumns> | null {
    const name = draft.row.values[field];
    const groups = field === 'chain' ? this.memory.chains : this.memory.regions;
    const known = name === undefined ? groups.only : groups.find(name);
    if (known?.retired) {
      draft.fault(field, 'retired', name);
      return null;
    }
    if (known) return this.touch(draft, field, known);
    if (name === undefined) {
      if (field === 'chain') draft.fault('chain', 'chain-unknown');
      else draft.need('region');
      return null;
    }
    if (this.kind === 'components') {
      draft.fault('chain', 'chain-unknown', name);
      return null;
    }
    return this.newGroup(draft, field, name);
  }

  private ownGroup(draft: RowDraft, field: 'chain' | 'region'): void {
    const name = draft.row.values[field];
    if (name === undefined) return draft.need(field);
    const known = this.memory[field === 'chain' ? 'chains' : 'regions'].find(name);
    if (known?.row != null) draft.fault(field, 'doubled', name, { row: known.row });
    else if (known?.retired) draft.fault(field, 'retired', name);
    else if (known) this.touch(draft, field, known);
    else this.newGroup(draft, field, name);
  }

  private newGroup(
    draft: RowDraft,
    field: 'chain' | 'region',
    name: string,
  ): State<GroupColumns> | null {
    if (!mayEverywhere('fleet.import', this.actor.grants)) {
      draft.fault(field, 'not-yours', name);
      return null;
    }
    const columns = { name: name.replace(/\s+/g, ' ') };
    const group = { id: randomUUID(), columns, retired: false, row: draft.row.number };
    draft.changes[`${field}s`].push(change(draft, group.id, null, columns));
    draft.whenTaken.push(() => this.memory[`${field}s`].remember(group));
    return group;
  }

  /** Counts a group that the file names for the first time. */
  private touch(draft: RowDraft, field: 'chain' | 'region', known: State<GroupColumns>) {
    if (known.row === null) {
      const { id, columns } = known;
      draft.changes[`${field}s`].push(change(draft, id, columns, columns));
      draft.whenTaken.push(() =>
        this.memory[`${field}s`].remember({ ...known, row: draft.row.number }),
      );
    }
    return known;
  }

  private dayAt(timeZone: string): string {
    const known = this.today.get(timeZone);
    if (known) return known;
    const day = localDay(this.now, timeZone);
    this.today.set(timeZone, day);
    return day;
  }
}

/** `before` stands for `after` where nothing changes. */
function change<Columns extends object>(
  { row }: RowDraft,
  id: string,
  before: Columns | null,
  after: Columns,
): Change<Columns> {
  return { id, row: row.number, before: before && same(before, after) ? after : before, after };
}
