import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { PageEmpty } from '../ui/page-states/page-empty';

/** Shown for an address that names no page. */
@Component({
  selector: 'vw-not-found',
  imports: [PageEmpty, RouterLink],
  template: `
    <vw-page-empty
      [level]="1"
      icon="search"
      i18n-heading="@@shell.not-found"
      heading="Nothing is here"
      i18n-advice="@@shell.not-found-advice"
      advice="The link may be old or mistyped."
    >
      <a routerLink="/" i18n="@@shell.to-start">Go to your first page</a>
    </vw-page-empty>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
