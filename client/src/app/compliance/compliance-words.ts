import { inject, Injectable, LOCALE_ID } from '@angular/core';
import { countedWindows, type WindowCounts } from '@shared/compliance/on-time-rate';
import type { ComplianceRow, Grouping } from './compliance-api';

type Window = NonNullable<ComplianceRow['window']>;

/** Figures of compliance in the reader's words. */
@Injectable({ providedIn: 'root' })
export class ComplianceWords {
  private readonly locale = inject(LOCALE_ID);
  private readonly whole = new Intl.NumberFormat(this.locale);
  private readonly tenths = new Intl.NumberFormat(this.locale, {
    minimumFractionDigits: 1,
    maximumFractionDigits: 1,
  });
  private readonly percent = new Intl.NumberFormat(this.locale, {
    style: 'percent',
    minimumFractionDigits: 1,
    maximumFractionDigits: 1,
  });
  private readonly monthOf = new Intl.DateTimeFormat(this.locale, {
    month: 'short',
    year: 'numeric',
    timeZone: 'UTC',
  });

  count(count: number): string {
    return this.whole.format(count);
  }

  rate(share: number | null): string {
    return share === null ? '–' : this.percent.format(share);
  }

  /** "31 of 34". */
  of(counts: WindowCounts): string {
    const onTime = this.count(counts.onTime);
    const counted = this.count(countedWindows(counts));
    return $localize`:@@compliance.of:${onTime}:onTime: of ${counted}:counted:`;
  }

  /** A change in percentage points with its sign: "+2.5"; nothing is a dash. */
  change(points: number | null): string {
    if (points === null) return '–';
    if (points === 0) return this.tenths.format(0);
    return `${points < 0 ? '−' : '+'}${this.tenths.format(Math.abs(points))}`;
  }

  /** A month, `YYYY-MM`: "Mar 2026". */
  month(month: string): string {
    return this.monthOf.format(Date.parse(`${month}-01T00:00:00Z`));
  }

  /** The setting that a rule's rate hangs on. */
  window({ kind, before, after }: Window): string {
    return kind === 'days'
      ? $localize`:@@compliance.window.days:days: ${before}:before: before, ${after}:after: after`
      : $localize`:@@compliance.window.hours:hours: ${before}:before: before, ${after}:after: after`;
  }

  grouping(by: Grouping): string {
    switch (by) {
      case 'store':
        return $localize`:@@compliance.by.store:Store`;
      case 'region':
        return $localize`:@@compliance.by.region:Region`;
      case 'chain':
        return $localize`:@@compliance.by.chain:Chain`;
      case 'rule':
        return $localize`:@@compliance.by.rule:Rule`;
    }
  }
}
