import type { LifeKind } from './lay-out-marks';

/** The word for a mark on a life line. */
export function lifeWord(kind: LifeKind): string {
  switch (kind) {
    case 'installed':
      return $localize`:@@ui.life.installed:installed`;
    case 'inspected':
      return $localize`:@@ui.life.inspected:inspected`;
    case 'found':
      return $localize`:@@ui.life.found:found`;
    case 'repaired':
      return $localize`:@@ui.life.repaired:repaired`;
    case 'replaced':
      return $localize`:@@ui.life.replaced:replaced`;
    case 'judged':
      return $localize`:@@ui.life.judged:judged`;
  }
}
