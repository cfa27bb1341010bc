import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import type { Theme } from '../../session/theme-choice';
import { ThemeChoice } from '../../session/theme-choice';

/** Light, dark or as the system, on this device. */
@Component({
  selector: 'vw-theme-field',
  imports: [MatRadioButton, MatRadioGroup],
  template: `
    <h2 id="theme-heading" i18n="@@sign-in.theme">Look on this device</h2>
    <mat-radio-group
      aria-labelledby="theme-heading"
      [value]="theme.theme()"
      (change)="choose($event.value)"
    >
      <mat-radio-button value="system" i18n="@@sign-in.theme-system"
        >As the system</mat-radio-button
      >
      <mat-radio-button value="light" i18n="@@sign-in.theme-light">Light</mat-radio-button>
      <mat-radio-button value="dark" i18n="@@sign-in.theme-dark">Dark</mat-radio-button>
    </mat-radio-group>
  `,
  styleUrls: ['./section.scss', './theme-field.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ThemeField {
  protected readonly theme = inject(ThemeChoice);

  protected choose(theme: Theme): void {
    this.theme.choose(theme);
  }
}
