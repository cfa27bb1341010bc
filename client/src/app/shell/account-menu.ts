import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatDivider } from '@angular/material/divider';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { Router, RouterLink } from '@angular/router';
import { LanguageChoice } from '../session/language-choice';
import { roleWord } from '../session/role-word';
import { Session } from '../session/session';
import type { Theme } from '../session/theme-choice';
import { ThemeChoice } from '../session/theme-choice';
import { Icon } from '../ui/icon/icon';
import type { IconName } from '../ui/icon/icon-paths';

/** Who is signed in and for what; language, look, account, and the way out. */
@Component({
  selector: 'vw-account-menu',
  imports: [Icon, MatDivider, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink],
  templateUrl: './account-menu.html',
  styleUrl: './account-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountMenu {
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  protected readonly language = inject(LanguageChoice);
  protected readonly theme = inject(ThemeChoice);

  protected readonly person = this.session.person;

  /** The first role with its scope, as the header of the drawing has it. */
  protected readonly where = computed(() => {
    const held = this.session.roles()[0];
    return held ? `${held.scopeName} · ${roleWord(held.role)}` : '';
  });

  protected readonly themes: readonly {
    readonly theme: Theme;
    readonly icon: IconName;
    readonly label: string;
  }[] = [
    {
      theme: 'system',
      icon: 'theme-system',
      label: $localize`:@@shell.theme-system:As the system`,
    },
    { theme: 'light', icon: 'theme-light', label: $localize`:@@shell.theme-light:Light` },
    { theme: 'dark', icon: 'theme-dark', label: $localize`:@@shell.theme-dark:Dark` },
  ];

  protected signOut(): void {
    this.session.signOut().subscribe({
      next: () => void this.router.navigateByUrl('/sign-in'),
    });
  }
}
