/** Where it is kept that a photo was asked for, before the camera opens: the page may be killed behind it. */
export const ASKED_PHOTO_KEY = 'photo-asked';

export interface AskedPhotoDraft {
  buildId: string;
  stepId: string | null;
  wantedId: string | null;
  askedAt: number;
}

export function readAsked(text: string): AskedPhotoDraft | null {
  if (!text) return null;
  try {
    const draft = JSON.parse(text) as Partial<AskedPhotoDraft>;
    if (typeof draft.buildId !== 'string' || typeof draft.askedAt !== 'number') return null;
    return {
      buildId: draft.buildId,
      stepId: draft.stepId ?? null,
      wantedId: draft.wantedId ?? null,
      askedAt: draft.askedAt,
    };
  } catch {
    // Cut off by the very kill that it guards against: nothing is known to have been asked.
    return null;
  }
}
