import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { UnitKind } from '@shared/fleet/fleet-words';
import type { FieldDifference } from '../edit-conflict/edit-conflict';
import { differencesOf } from '../edit-conflict/edit-conflict';
import type { PartForm } from '../part-fields/part-form';
import type { Unit, UnitBody } from '../unit-api';

const line = (value: string, max: number, required = false) =>
  new FormControl(value, {
    nonNullable: true,
    validators: [Validators.maxLength(max), ...(required ? [Validators.required] : [])],
  });

/** Controls stand at the paths of the contract, so that the server's faults find them. */
export function unitForm(unit?: Partial<Unit>) {
  return new FormGroup({
    storeId: line(unit?.storeId ?? '', 36, true),
    tag: line(unit?.tag ?? '', 40, true),
    kind: new FormControl<UnitKind>(unit?.kind ?? 'built-in', { nonNullable: true }),
    vats: new FormControl<number | null>(unit?.vats ?? null, [
      Validators.required,
      Validators.min(1),
      Validators.max(12),
    ]),
    oilPounds: new FormControl<number | null>(unit?.oilPounds ?? null, [
      Validators.min(0.1),
      Validators.max(9999),
    ]),
    model: line(unit?.model ?? '', 80),
    installedOn: line(unit?.installedOn ?? '', 10),
    outOfServiceSince: line(unit?.outOfServiceSince ?? '', 10),
    /** Only of a new unit; those of a unit there already have acts of their own. */
    components: new FormArray<PartForm>([]),
  });
}

export type UnitForm = ReturnType<typeof unitForm>;

/** What the form says, as the server takes it. */
export function unitBody(form: UnitForm): UnitBody {
  const {
    components: _components,
    vats,
    installedOn,
    outOfServiceSince,
    ...rest
  } = form.getRawValue();
  return {
    ...rest,
    vats: vats ?? 0,
    installedOn: installedOn || null,
    outOfServiceSince: outOfServiceSince || null,
  };
}

/** Names of a unit's fields, by their paths. */
export function unitLabels() {
  return {
    storeId: $localize`:@@fleet.store:Store`,
    tag: $localize`:@@fleet.tag:Tag`,
    kind: $localize`:@@fleet.kind:Kind`,
    vats: $localize`:@@fleet.vats:Vats`,
    oilPounds: $localize`:@@fleet.oil:Oil, pounds`,
    model: $localize`:@@fleet.model:Model`,
    installedOn: $localize`:@@fleet.installed-on:Installed on`,
    outOfServiceSince: $localize`:@@fleet.out-since:Out of service since`,
  };
}

/** Where a unit as somebody else saved it differs from what is being sent. */
export function unitDifferences(theirs: Unit, mine: UnitBody): readonly FieldDifference[] {
  const { storeId, ...labels } = unitLabels();
  const moved = theirs.storeId !== mine.storeId;
  return [
    ...differencesOf(unitBody(unitForm(theirs)), mine, labels),
    ...(moved
      ? [
          {
            label: storeId,
            theirs: `${theirs.storeNumber} ${theirs.storeName}`,
            mine: $localize`:@@fleet.as-chosen:as chosen here`,
          },
        ]
      : []),
  ];
}
