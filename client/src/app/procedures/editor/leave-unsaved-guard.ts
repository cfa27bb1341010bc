import { inject } from '@angular/core';
import type { CanDeactivateFn } from '@angular/router';
import { map } from 'rxjs';
import { Confirm } from '../../ui/confirm-dialog/confirm';

/** A page that knows whether something in it would be lost. */
export interface HoldsWork {
  readonly hasUnsavedWork: () => boolean;
}

/** Asks before work that was not saved is left behind. */
export const leaveUnsaved: CanDeactivateFn<HoldsWork> = (page) =>
  !page.hasUnsavedWork() ||
  inject(Confirm)
    .ask({
      title: $localize`:@@procedures.leave-ask:Leave without saving?`,
      text: $localize`:@@procedures.leave-text:What you wrote since the last save is lost.`,
      yes: $localize`:@@procedures.leave:Leave`,
      no: $localize`:@@procedures.stay:Stay here`,
      grave: true,
    })
    .pipe(map((answer) => answer !== null));
