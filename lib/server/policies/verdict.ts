import { AppError, type FailureCode } from '../errors';

/** What a policy says: yes, or no with a code and words for the person. */
export type Verdict = { ok: true } | { ok: false; code: FailureCode; detail: string };

export const allowed: Verdict = { ok: true };

/** Refused, although the person may know that the thing exists. */
export const refused = (detail: string): Verdict => ({ ok: false, code: 'not-allowed', detail });

/** Refused as if the thing did not exist, since the person may not know that it does. */
export const hidden = (detail: string): Verdict => ({ ok: false, code: 'not-found', detail });

/** @throws AppError when the verdict is no */
export function demand(verdict: Verdict): void {
  if (!verdict.ok) throw new AppError(verdict.code, verdict.detail);
}
