import type { HttpResourceRef } from '@angular/common/http';
import type { Signal } from '@angular/core';
import { linkedSignal } from '@angular/core';

/**
 * The value of a read, held while the next one is on its way: what is on show stays where it is,
 * and so does the focus in it, until there is something to put in its place.
 */
export function kept<Value>(resource: HttpResourceRef<Value | undefined>): Signal<Value | null> {
  return linkedSignal<Value | null, Value | null>({
    source: () => (resource.hasValue() ? (resource.value() ?? null) : null),
    computation: (now, before) => now ?? before?.value ?? null,
  });
}
