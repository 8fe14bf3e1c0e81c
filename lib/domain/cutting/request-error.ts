/**
 * A cutting request that no plan can answer as it stands: a size of zero, a negative kerf, a number that is not whole.
 * The message is a sentence for the person: what is wrong and what to change. Parts that merely do not fit are no
 * error; they come back as `unplaced`.
 */
export class CuttingRequestError extends Error {
  override readonly name = 'CuttingRequestError';
}
