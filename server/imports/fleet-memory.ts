import type { ImportKind } from '@shared/imports/import-fields';
import type { ReadRow } from '@shared/imports/read-row';
import type { Tenant } from '@db/tenant-transaction';
import type { GroupColumns, Known, StoreColumns, UnitColumns } from './fleet-records';
import { bareNumber, groupsOf, partsOf, storesByNumber, unitsByTag } from './look-up-fleet';
import { type PartState, saidParts } from './merge-parts';

/** A thing as the rows so far leave it, and the first row that spoke of it. */
export interface State<Columns> extends Known<Columns> {
  readonly row: number | null;
}

const groupKey = (name: string) => name.replace(/\s+/g, ' ').toLowerCase();
const storeKey = (chainId: string, number: string) => `${chainId} ${bareNumber(number)}`;
const unitKey = (storeId: string, tag: string) => `${storeId} ${tag.toLowerCase()}`;

/** Chains, or regions: found by name whatever the case and spaces. */
export class GroupMemory {
  private readonly byName = new Map<string, State<GroupColumns>>();
  private readonly live: State<GroupColumns>[] = [];

  remember(group: State<GroupColumns>): void {
    this.byName.set(groupKey(group.columns.name), group);
    if (group.row === null && !group.retired) this.live.push(group);
  }

  find(name: string): State<GroupColumns> | undefined {
    return this.byName.get(groupKey(name));
  }

  /** The only one in use, where a file need not say which. */
  get only(): State<GroupColumns> | undefined {
    return this.live.length === 1 ? this.live[0] : undefined;
  }
}

/**
 * The part of the fleet that a file speaks of, as the database has it and the rows so far leave it.
 * It grows with the file, whose rows are bounded, not with the fleet.
 */
export class FleetMemory {
  readonly chains = new GroupMemory();
  readonly regions = new GroupMemory();
  private readonly stores = new Map<string, State<StoreColumns>[]>();
  private readonly units = new Map<string, State<UnitColumns>>();
  private readonly parts = new Map<string, PartState[]>();

  private constructor(private readonly kind: ImportKind) {}

  static async begin(tenant: Tenant, kind: ImportKind): Promise<FleetMemory> {
    const memory = new FleetMemory(kind);
    for (const it of await groupsOf(tenant, 'chains')) memory.chains.remember({ ...it, row: null });
    for (const it of await groupsOf(tenant, 'regions'))
      memory.regions.remember({ ...it, row: null });
    return memory;
  }

  store(chainId: string, number: string): State<StoreColumns> | undefined {
    const all = this.stores.get(storeKey(chainId, number)) ?? [];
    return (
      all.find((it) => it.columns.number === number) ?? (all.length === 1 ? all[0] : undefined)
    );
  }

  rememberStore(store: State<StoreColumns>): void {
    const key = storeKey(store.columns.chain_id, store.columns.number);
    const others = (this.stores.get(key) ?? []).filter(({ id }) => id !== store.id);
    this.stores.set(key, [...others, store]);
  }

  unit(storeId: string, tag: string): State<UnitColumns> | undefined {
    return this.units.get(unitKey(storeId, tag));
  }

  rememberUnit(unit: State<UnitColumns>): void {
    this.units.set(unitKey(unit.columns.store_id, unit.columns.tag), unit);
  }

  partsOf(unitId: string): readonly PartState[] {
    return this.parts.get(unitId) ?? [];
  }

  rememberPart(part: PartState): void {
    const unitId = part.columns.unit_id;
    const others = this.partsOf(unitId).filter(({ id }) => id !== part.id);
    this.parts.set(unitId, [...others, part]);
  }

  /** Reads what the next rows speak of and is not known yet: one statement per table. */
  async lookUp(tenant: Tenant, rows: readonly ReadRow[], lock: boolean): Promise<void> {
    if (this.kind === 'chains' || this.kind === 'regions') return;
    const stores = rows.flatMap(({ values }) => {
      const chain = values.chain === undefined ? this.chains.only : this.chains.find(values.chain);
      return chain && values.storeNumber !== undefined
        ? [{ chainId: chain.id, number: values.storeNumber, values }]
        : [];
    });
    const newStores = stores.filter((it) => !this.stores.has(storeKey(it.chainId, it.number)));
    for (const it of await storesByNumber(tenant, newStores, lock)) {
      this.rememberStore({ ...it, row: null });
    }
    if (this.kind === 'stores') return;
    const units = stores.flatMap(({ chainId, number, values }) => {
      const store = this.store(chainId, number);
      return store && values.unitTag !== undefined
        ? [{ storeId: store.id, tag: values.unitTag, values }]
        : [];
    });
    const newUnits = units.filter((it) => !this.units.has(unitKey(it.storeId, it.tag)));
    const found = await unitsByTag(tenant, newUnits, lock);
    for (const it of found) this.rememberUnit({ ...it, row: null });
    if (!units.some(({ values }) => saidParts(values).length > 0)) return;
    const ids = found.map(({ id }) => id).filter((id) => !this.parts.has(id));
    for (const it of await partsOf(tenant, ids, lock)) this.rememberPart({ ...it, row: null });
  }
}
