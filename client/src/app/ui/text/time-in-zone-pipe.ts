import type { PipeTransform } from '@angular/core';
import { inject, LOCALE_ID, Pipe } from '@angular/core';
import { VIEWER_ZONE } from './viewer-zone';
import type { ZonedStyle } from './zoned-text';
import { zonedText } from './zoned-text';

/**
 * An instant in the zone of the place it is about: `{{ task.closesAt | timeInZone: store.timeZone }}`,
 * with the zone's name when the reader's clock shows something else.
 */
@Pipe({ name: 'timeInZone' })
export class TimeInZonePipe implements PipeTransform {
  private readonly locale = inject(LOCALE_ID);
  private readonly viewerZone = inject(VIEWER_ZONE);

  transform(
    instant: string | number | null | undefined,
    zone: string,
    style: ZonedStyle = 'date-time',
  ): string {
    return zonedText(instant, zone, this.viewerZone(), this.locale, style);
  }
}
