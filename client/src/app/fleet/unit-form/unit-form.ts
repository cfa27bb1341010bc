import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import type { ComponentKind } from '@shared/fleet/fleet-words';
import {
  componentKinds,
  componentKindWords,
  singleComponents,
  unitKinds,
  unitKindWords,
} from '@shared/fleet/fleet-words';
import { newId } from '../../api/new-id';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { FieldDifference } from '../edit-conflict/edit-conflict';
import { EditConflict } from '../edit-conflict/edit-conflict';
import { FleetApi } from '../fleet-api';
import { isConflict, showFleetFaults } from '../fleet-problem';
import { partIcons, storeTitle } from '../fleet-words';
import { PartFieldset } from '../part-fields/part-fields';
import type { PartForm } from '../part-fields/part-form';
import { newPart, partForm, partLabels } from '../part-fields/part-form';
import { StorePicker } from '../store-picker/store-picker';
import type { Unit } from '../unit-api';
import { UnitApi } from '../unit-api';
import { unitBody, unitDifferences, unitForm, unitLabels } from './unit-form-model';

/** Adds a unit with its parts, or changes one. */
@Component({
  selector: 'vw-unit-form',
  imports: [
    EditConflict,
    FieldError,
    Icon,
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    PageHeader,
    PageLoading,
    PartFieldset,
    ProblemSummary,
    ProblemView,
    ReactiveFormsModule,
    RouterLink,
    StorePicker,
  ],
  templateUrl: './unit-form.html',
  styleUrl: '../fleet-form.scss',
  styles: `
    .part-head {
      display: flex;
      gap: var(--vw-space-2);
      align-items: center;
      margin-bottom: var(--vw-space-3);
    }
    .part-head h3 {
      margin-right: auto;
    }
    .part {
      padding: var(--vw-space-3) 0 var(--vw-space-4);
      border-top: 1px solid var(--vw-line);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitFormPage {
  private readonly api = inject(UnitApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  protected readonly language = inject(LanguageChoice).current;

  /** Absent for a new unit. */
  readonly id = input<string>();
  /** Store of a new unit, where it is known from where one came. */
  readonly store = input<string>();

  protected readonly resource = this.api.unit(() => this.id());
  private readonly home = inject(FleetApi).store(() => (this.id() ? undefined : this.store()));
  protected readonly base = signal<Unit | null>(null);
  protected readonly form = signal(unitForm());
  protected readonly isNew = computed(() => this.id() === undefined);
  protected readonly ready = computed(() =>
    this.isNew() ? !this.home.isLoading() : this.base() !== null,
  );
  protected readonly storeName = computed(() => {
    const base = this.base();
    if (base) return `${base.storeNumber} ${base.storeName}`;
    return this.home.hasValue() ? storeTitle(this.home.value()) : '';
  });
  protected readonly back = computed(() => {
    if (!this.isNew()) return ['/fleet/units', this.id()];
    return this.store() ? ['/fleet/stores', this.store()] : ['/fleet/units'];
  });
  protected readonly title = computed(
    () => this.base()?.tag ?? $localize`:@@fleet.new-unit:New unit`,
  );
  protected readonly kinds = unitKinds;
  protected readonly kindWords = unitKindWords;
  protected readonly partKinds = componentKinds;
  protected readonly partWords = componentKindWords;
  protected readonly icons = partIcons;
  protected readonly labels = unitLabels();
  protected readonly allLabels = signal<Readonly<Record<string, string>>>(this.labels);
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  protected readonly conflict = signal<{
    readonly theirs: Unit;
    readonly differences: readonly FieldDifference[];
  } | null>(null);
  /** Made once, so that sending twice creates once. */
  private readonly newId = newId();
  private readonly partIds = new WeakMap<PartForm, string>();

  constructor() {
    effect(() => {
      const unit = this.resource.hasValue() ? this.resource.value() : null;
      // The form is filled once; later answers of the server must not undo what is being written.
      if (unit && this.base() === null) this.fill(unit);
    });
    effect(() => {
      if (this.home.hasValue()) this.form().controls.storeId.setValue(this.home.value().id);
    });
  }

  readonly hasUnsavedWork = (): boolean => this.form().dirty;

  /** Kinds of which the new unit may still take one. */
  protected mayAdd(kind: ComponentKind): boolean {
    const parts = this.form().controls.components.getRawValue();
    return !singleComponents.includes(kind) || parts.every((part) => part.kind !== kind);
  }

  protected addPart(kind: ComponentKind): void {
    const { components, installedOn } = this.form().controls;
    const part = partForm(kind, { installedOn: installedOn.value });
    this.partIds.set(part, newId());
    components.push(part);
    components.markAsDirty();
  }

  protected dropPart(index: number): void {
    this.form().controls.components.removeAt(index);
  }

  protected takeTheirs(theirs: Unit): void {
    this.conflict.set(null);
    this.fill(theirs);
  }

  protected keepMine(theirs: Unit): void {
    this.conflict.set(null);
    this.base.set(theirs);
    this.save();
  }

  protected save(): void {
    const form = this.form();
    this.general.set([]);
    this.allLabels.set(labelsOf(form.controls.components.controls, this.labels));
    if (form.invalid) {
      form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const base = this.base();
    const parts = form.controls.components.controls.map((part) =>
      newPart(this.partIds.get(part) ?? newId(), part),
    );
    const saving = base
      ? this.api.editUnit(base.id, base.version, unitBody(form))
      : this.api.createUnit(this.newId, unitBody(form), parts);
    this.busy.set(true);
    saving.subscribe({
      next: (saved) => {
        form.markAsPristine();
        this.notices.tell({ text: $localize`:@@fleet.unit-saved:Unit saved.` });
        void this.router.navigate(['/fleet/units', saved.id], { replaceUrl: base === null });
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        if (base && isConflict(failure)) this.showConflict(base.id);
        else this.show(failure);
      },
    });
  }

  private show(failure: unknown): void {
    this.general.set(showFleetFaults(this.form(), failure));
    this.tries.update((count) => count + 1);
  }

  private fill(unit: Unit): void {
    this.base.set(unit);
    this.form.set(unitForm(unit));
  }

  private showConflict(id: string): void {
    this.api.readUnit(id).subscribe({
      next: (theirs) =>
        this.conflict.set({ theirs, differences: unitDifferences(theirs, unitBody(this.form())) }),
      error: (failure: unknown) => this.show(failure),
    });
  }
}

/** The unit's labels with those of its parts, by their paths. */
function labelsOf(
  parts: readonly PartForm[],
  labels: Readonly<Record<string, string>>,
): Readonly<Record<string, string>> {
  const own = Object.entries(partLabels());
  const ofParts = parts.flatMap((_, index) =>
    own.map(([path, label]) => [`components.${index}.${path}`, label] as const),
  );
  return { ...labels, ...Object.fromEntries(ofParts) };
}
