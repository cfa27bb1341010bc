import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../../ui/page-header/page-header';
import { DetailsForm } from './details-form';
import { PasswordForm } from './password-form';
import { SessionList } from './session-list';
import { ThemeField } from './theme-field';

/** What a person can set for themselves. */
@Component({
  selector: 'vw-account-page',
  imports: [DetailsForm, PageHeader, PasswordForm, SessionList, ThemeField],
  template: `
    <div class="vw-page-narrow">
      <vw-page-header i18n-heading="@@sign-in.account-title" heading="Your account" />
      <div class="sections">
        <vw-details-form />
        <vw-theme-field />
        <vw-password-form />
        <vw-session-list />
      </div>
    </div>
  `,
  styles: `
    .sections {
      display: grid;
      gap: var(--vw-space-6);
      margin-top: var(--vw-space-4);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountPage {}
