import type { BuildState, Claim, CollectionItem } from './state';

/** Own value of a key: a state that came back from storage has a prototype, and ids are other people's words. */
export function at<V>(record: Readonly<Record<string, V>>, key: string): V | undefined {
  return Object.hasOwn(record, key) ? record[key] : undefined;
}

/** True while the register of undos says that the entry does not count. */
export function isUndone(state: BuildState, entryId: string): boolean {
  const claims = at(state.undone, entryId);
  return claims?.at(-1)?.value.undone ?? false;
}

/** The claim in force on a register: the last by standing whose entry is not undone. */
export function inForce<V>(state: BuildState, claims: readonly Claim<V>[] | undefined): Claim<V> | undefined {
  return claims?.findLast((claim) => !isUndone(state, claim.entryId));
}

/** The claims that count, in order of standing. */
export function counting<V>(state: BuildState, claims: readonly Claim<V>[] | undefined): Claim<V>[] {
  return (claims ?? []).filter((claim) => !isUndone(state, claim.entryId));
}

/** True when an item of a collection was taken out and not put back. */
export function isRemoved(
  state: BuildState,
  collection: 'notes' | 'measurements' | 'photos' | 'departures',
  item: CollectionItem<unknown>,
): boolean {
  return inForce(state, at(state.removed, `${collection}/${item.id}`))?.value.removed ?? false;
}
