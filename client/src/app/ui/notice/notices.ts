import { Injectable, signal } from '@angular/core';

/** A line shown for a while at the foot of the page. */
export interface Notice {
  readonly text: string;
  readonly action?: { readonly label: string; readonly run: () => void };
  /** Read out at once, for what went wrong. */
  readonly urgent?: boolean;
  /** Stays until closed. */
  readonly stays?: boolean;
}

/** Milliseconds a notice is shown; with an action there must be time to reach it. */
const SHOWN = { plain: 6000, withAction: 12000 } as const;

/** Tells the person what was done, with a way back where there is one. */
@Injectable({ providedIn: 'root' })
export class Notices {
  private readonly shown = signal<Notice | null>(null);
  private timer: ReturnType<typeof setTimeout> | undefined;

  /** What is on screen now. */
  readonly current = this.shown.asReadonly();

  /** Shows a notice in place of the one before. */
  tell(notice: Notice): void {
    this.shown.set(notice);
    this.resume();
  }

  /** Says what was done and offers to undo it. */
  offerUndo(text: string, undo: () => void): void {
    this.tell({ text, action: { label: $localize`:@@ui.undo:Undo`, run: undo } });
  }

  /** Keeps the notice while the pointer or the focus is on it. */
  hold(): void {
    clearTimeout(this.timer);
  }

  /** Lets the time run again. */
  resume(): void {
    clearTimeout(this.timer);
    const notice = this.shown();
    if (!notice || notice.stays) return;
    this.timer = setTimeout(() => this.dismiss(), notice.action ? SHOWN.withAction : SHOWN.plain);
  }

  /** Takes the notice away. */
  dismiss(): void {
    clearTimeout(this.timer);
    this.shown.set(null);
  }
}
