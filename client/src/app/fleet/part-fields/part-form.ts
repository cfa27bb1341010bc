import { FormControl, FormGroup, Validators } from '@angular/forms';
import type { ComponentKind, PumpFace } from '@shared/fleet/fleet-words';
import type { Nameplate } from '@shared/fleet/nameplate';
import type { NewPart, Part, PartFields } from '../unit-api';

const line = (value: string, max: number) =>
  new FormControl(value, { nonNullable: true, validators: [Validators.maxLength(max)] });

/** A figure of the nameplate: above zero, at most `max`, or not known. */
const figure = (value: number | undefined, max: number) =>
  new FormControl<number | null>(value ?? null, [Validators.min(0.01), Validators.max(max)]);

/** What is known of a part; controls stand at the paths of the contract. */
export function partForm(kind: ComponentKind, part?: Partial<Part>) {
  const plate: Nameplate = part?.nameplate ?? {};
  return new FormGroup({
    kind: new FormControl<ComponentKind>(kind, { nonNullable: true }),
    serialNumber: line(part?.serialNumber ?? '', 80),
    model: line(part?.model ?? '', 80),
    pumpFace: new FormControl<PumpFace | ''>(part?.pumpFace ?? '', { nonNullable: true }),
    installedOn: new FormControl(part?.installedOn ?? '', {
      nonNullable: true,
      validators: [Validators.required],
    }),
    nameplate: new FormGroup({
      volts: figure(plate.volts, 1000),
      amps: figure(plate.amps, 200),
      horsepower: figure(plate.horsepower, 20),
      phase: new FormControl<1 | 3 | null>(plate.phase ?? null),
      rpm: figure(plate.rpm, 10_000),
    }),
  });
}

export type PartForm = ReturnType<typeof partForm>;

/** What the form says, as the server takes it; what does not belong to the kind is left out. */
export function partFields(form: PartForm): PartFields {
  const { kind, pumpFace, nameplate, ...rest } = form.getRawValue();
  const known = Object.entries(nameplate).filter(([, value]) => value !== null);
  return {
    ...rest,
    pumpFace: kind === 'pump' && pumpFace !== '' ? pumpFace : null,
    nameplate: kind === 'motor' ? (Object.fromEntries(known) as Nameplate) : {},
  };
}

export function newPart(id: string, form: PartForm): NewPart {
  return { id, kind: form.controls.kind.value, ...partFields(form) };
}

/** Names of a part's fields, by their paths. */
export function partLabels(): Readonly<Record<string, string>> {
  return {
    kind: $localize`:@@fleet.kind:Kind`,
    serialNumber: $localize`:@@fleet.serial:Serial number`,
    model: $localize`:@@fleet.model:Model`,
    pumpFace: $localize`:@@fleet.pump-face:Face of the pump`,
    installedOn: $localize`:@@fleet.fitted-on:Fitted on`,
    'nameplate.volts': $localize`:@@fleet.volts:Volts`,
    'nameplate.amps': $localize`:@@fleet.amps:Amperes at full load`,
    'nameplate.horsepower': $localize`:@@fleet.horsepower:Horsepower`,
    'nameplate.phase': $localize`:@@fleet.phase:Phases`,
    'nameplate.rpm': $localize`:@@fleet.rpm:Revolutions per minute`,
  };
}
