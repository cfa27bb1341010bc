import type { FieldError } from '@shared/problem';
import { Problem } from './problem';

/** What the screen says about a problem: what happened, and what one can do. */
export interface ProblemWords {
  readonly title: string;
  readonly advice: string;
  /** For the person to read out to whoever helps; empty when the server never saw the request. */
  readonly requestId: string;
}

/**
 * The words for a problem in the reader's language. The server's own detail is kept where it says
 * more than the status does (a refusal with a reason, a conflict).
 */
export function problemWords(failure: unknown): ProblemWords {
  const problem = failure instanceof Problem ? failure : new Problem(0, 'unreadable');
  const [title, advice] = wordsByStatus(problem);
  return { title, advice, requestId: problem.requestId };
}

function wordsByStatus(problem: Problem): readonly [string, string] {
  const { status, detail } = problem;
  if (problem.code === 'offline') {
    return [
      $localize`:@@problems.offline:No connection`,
      $localize`:@@problems.offline-advice:Check the network, then try again. What you entered is still here.`,
    ];
  }
  if (status === 401) {
    return [
      $localize`:@@problems.signed-out:You are signed out`,
      $localize`:@@problems.signed-out-advice:Sign in again to go on.`,
    ];
  }
  if (status === 403) {
    return [
      $localize`:@@problems.forbidden:This is not yours to see or change`,
      detail ||
        $localize`:@@problems.forbidden-advice:Ask an administrator if you need it for your work.`,
    ];
  }
  if (status === 404 || status === 410) {
    return [
      $localize`:@@problems.not-found:Nothing is here`,
      detail ||
        $localize`:@@problems.not-found-advice:It may have been removed, or the link may be wrong.`,
    ];
  }
  if (status === 409 || status === 412) {
    return [
      $localize`:@@problems.conflict:Someone changed this meanwhile`,
      detail || $localize`:@@problems.conflict-advice:Load it again to see the newer version.`,
    ];
  }
  if (status === 413) {
    return [
      $localize`:@@problems.too-large:The file is too large`,
      detail || $localize`:@@problems.too-large-advice:Send a smaller one.`,
    ];
  }
  if (status === 429) {
    return [
      $localize`:@@problems.too-many:Too many tries`,
      detail || $localize`:@@problems.too-many-advice:Wait a minute, then try again.`,
    ];
  }
  if (status >= 400 && status < 500) {
    return [
      problem.title || $localize`:@@problems.refused:That could not be accepted`,
      detail || $localize`:@@problems.refused-advice:Look over what you entered.`,
    ];
  }
  return [
    $localize`:@@problems.broken:Something went wrong on our side`,
    $localize`:@@problems.broken-advice:Try again. If it stays, report the number below.`,
  ];
}

/** The words for one refused field; reasons that we do not know keep the server's message. */
export function fieldWords(error: FieldError): string {
  switch (error.reason) {
    case 'required':
      return $localize`:@@problems.field.required:This is needed.`;
    case 'email':
      return $localize`:@@problems.field.email:Give an e-mail address, such as name@example.com.`;
    case 'taken':
      return $localize`:@@problems.field.taken:This is taken already.`;
    case 'password-common':
      return $localize`:@@problems.field.password-common:This password is too easy to guess. Use several unrelated words.`;
    case 'password-short':
      return $localize`:@@problems.field.password-short:Use at least 12 characters.`;
    case 'password-wrong':
      return $localize`:@@problems.field.password-wrong:This is not your current password.`;
    default:
      return error.message;
  }
}
