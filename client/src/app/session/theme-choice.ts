import { DOCUMENT, inject, Injectable, signal } from '@angular/core';

export type Theme = 'system' | 'light' | 'dark';

// theme.js reads the same key before the first paint.
const KEY = 'vw.theme';

/** The light or dark look: the system's, until the person chooses; remembered on this device. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  private readonly root = inject(DOCUMENT).documentElement;
  private readonly chosen = signal<Theme>(asTheme(this.root.dataset['theme']));

  readonly theme = this.chosen.asReadonly();

  choose(theme: Theme): void {
    this.chosen.set(theme);
    if (theme === 'system') delete this.root.dataset['theme'];
    else this.root.dataset['theme'] = theme;
    try {
      if (theme === 'system') localStorage.removeItem(KEY);
      else localStorage.setItem(KEY, theme);
    } catch {
      // Storage may be refused; the choice then lasts as long as the page.
    }
  }
}

function asTheme(value: string | undefined): Theme {
  return value === 'light' || value === 'dark' ? value : 'system';
}
