import type { PipeTransform } from '@angular/core';
import { inject, LOCALE_ID, Pipe } from '@angular/core';

/** A share from 0 to 1 as a percentage with one decimal: 0.931 → "93.1%"; nothing → "–". */
@Pipe({ name: 'rate' })
export class RatePipe implements PipeTransform {
  private readonly locale = inject(LOCALE_ID);

  transform(share: number | null | undefined, decimals = 1): string {
    if (share === null || share === undefined || Number.isNaN(share)) return '–';
    return new Intl.NumberFormat(this.locale, {
      style: 'percent',
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
    }).format(share);
  }
}
