export interface StampInput {
  /** The phone's clock when the entry was made, ms since 1970. */
  madeAt: number;
  /** Server's clock minus the phone's, ms, as measured on the last exchange; 0 when never measured. */
  clockOffsetMs: number;
  /** Server's clock at receipt, ms. */
  receivedAt: number;
  /** Greatest stamp among the entries at or below the entry's `seen`; null when it had seen none. */
  seenStamp: number | null;
  /** Stamp of the previous entry of the same phone in this build; null for its first. */
  previousStamp: number | null;
}

/**
 * Rule S4. The stamp orders entries: the phone's time corrected by the measured offset, not later than receipt, and not
 * earlier than anything the phone had seen or had itself made before. Those two were stamped at or before this receipt,
 * so the bounds never cross unless the server's own clock went back; then what was seen rules. No entry is refused for
 * its clock. Whole ms since 1970.
 */
export function assignStamp({ madeAt, clockOffsetMs, receivedAt, seenStamp, previousStamp }: StampInput): number {
  const corrected = Math.min(Math.round(madeAt + clockOffsetMs), Math.round(receivedAt));
  return Math.max(corrected, seenStamp ?? -Infinity, previousStamp ?? -Infinity);
}

/** The phone's own estimate of a stamp while the entry is held here: as {@link assignStamp}, received now. */
export function estimateStamp(input: Omit<StampInput, 'receivedAt'>): number {
  return assignStamp({ ...input, receivedAt: Infinity });
}
