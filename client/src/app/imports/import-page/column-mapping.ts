import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { DateOrder, ImportField } from '@shared/imports/import-fields';
import { fieldsOf, importFields } from '@shared/imports/import-fields';
import { LanguageChoice } from '../../session/language-choice';
import type { Import } from '../imports-api';
import { columnLetter } from './column-letter';
import { mappingFaults } from './mapping-faults';

export interface ChosenColumns {
  readonly fields: readonly (ImportField | null)[];
  readonly dateOrder: DateOrder;
}

const dateFields: readonly ImportField[] = [
  'unitInstalledOn',
  'outOfServiceSince',
  'pumpInstalledOn',
  'motorInstalledOn',
  'panInstalledOn',
  'hoseInstalledOn',
  'partInstalledOn',
];

/** What each column of the file holds: guessed from its heading, for the person to correct. */
@Component({
  selector: 'vw-column-mapping',
  imports: [MatButton],
  templateUrl: './column-mapping.html',
  styleUrl: './column-mapping.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnMapping {
  private readonly language = inject(LanguageChoice).current;

  readonly import = input.required<Import>();
  readonly busy = input(false);

  readonly confirmed = output<ChosenColumns>();

  protected readonly letter = columnLetter;
  protected readonly fields = linkedSignal(() => this.import().columns.map(({ field }) => field));
  protected readonly dateOrder = linkedSignal(() => this.import().dateOrder);
  protected readonly options = computed(() =>
    fieldsOf[this.import().kind].map((value) => ({ value, label: this.wordOf(value) })),
  );
  private readonly faults = computed(() => mappingFaults(this.import().kind, this.fields()));
  protected readonly missing = computed(() => this.faults().missing.map(this.wordOf).join(', '));
  protected readonly doubled = computed(() => this.faults().doubled.map(this.wordOf).join(', '));
  protected readonly used = computed(() => this.fields().filter((field) => field !== null).length);
  protected readonly hasDates = computed(() =>
    this.fields().some((field) => field !== null && dateFields.includes(field)),
  );

  protected isDoubled(field: ImportField | null): boolean {
    return field !== null && this.faults().doubled.includes(field);
  }

  protected choose(index: number, event: Event): void {
    const chosen = ((event.target as HTMLSelectElement).value || null) as ImportField | null;
    this.fields.update((fields) => fields.map((field, at) => (at === index ? chosen : field)));
  }

  protected order(event: Event): void {
    this.dateOrder.set((event.target as HTMLSelectElement).value as DateOrder);
  }

  protected confirm(): void {
    this.confirmed.emit({ fields: this.fields(), dateOrder: this.dateOrder() });
  }

  private readonly wordOf = (field: ImportField): string => importFields[field][this.language];
}
