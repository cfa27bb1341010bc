import { inject } from '@angular/core';
import type { CanDeactivateFn } from '@angular/router';
import { map } from 'rxjs';
import { Confirm } from './confirm';

/** A page that knows whether something in it would be lost. */
export interface HoldsWork {
  readonly hasUnsavedWork: () => boolean;
}

/** Asks before work that was not saved is left behind. */
export const leaveUnsaved: CanDeactivateFn<HoldsWork> = (page) =>
  !page.hasUnsavedWork() ||
  inject(Confirm)
    .ask({
      title: $localize`:@@ui.leave-ask:Leave without saving?`,
      text: $localize`:@@ui.leave-text:What you wrote since the last save is lost.`,
      yes: $localize`:@@ui.leave:Leave`,
      no: $localize`:@@ui.stay:Stay here`,
      grave: true,
    })
    .pipe(map((answer) => answer !== null));
