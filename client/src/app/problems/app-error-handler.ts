import { ErrorHandler, inject, Injectable } from '@angular/core';
import { Notices } from '../ui/notice/notices';
import { Problem } from './problem';
import { problemWords } from './problem-words';

/** The last stop of an error that nobody handled: the person is told, the browser's log keeps it. */
@Injectable()
export class AppErrorHandler extends ErrorHandler {
  private readonly notices = inject(Notices);

  override handleError(error: unknown): void {
    super.handleError(error);
    const cause = rejectionOf(error);
    if (isMissingChunk(cause)) {
      this.notices.tell({
        text: $localize`:@@problems.new-version:A new version is ready.`,
        action: {
          label: $localize`:@@problems.load-it:Load it`,
          run: () => document.location.reload(),
        },
        stays: true,
      });
      return;
    }
    // A request without an answer is shown where it was made; 401 leads to the sign-in page.
    if (cause instanceof Problem && cause.status === 401) return;
    const words = problemWords(cause instanceof Problem ? cause : new Problem(500, 'client'));
    const number = words.requestId ? ` (${words.requestId})` : '';
    this.notices.tell({
      text:
        cause instanceof Problem
          ? `${words.title}. ${words.advice}${number}`
          : $localize`:@@problems.client:This page ran into an error. Reload it if it behaves oddly.`,
      urgent: true,
    });
  }
}

function rejectionOf(error: unknown): unknown {
  return error instanceof Error && 'rejection' in error ? error.rejection : error;
}

// A page that was open across a release asks for files that are gone.
function isMissingChunk(error: unknown): boolean {
  return (
    error instanceof TypeError &&
    /dynamically imported module|module script failed/i.test(error.message)
  );
}
