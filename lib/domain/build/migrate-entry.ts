/**
 * Steps from one version of a kind's shape to the next, by kind. The step at index n turns version n + 1 into n + 2.
 * A released version is never taken out: a phone may have been away for months (rule S6).
 */
export type EntryMigrations = Readonly<Record<string, readonly ((parts: EntryParts) => EntryParts)[]>>;

export interface EntryParts {
  target: unknown;
  value: unknown;
}

export const entryMigrations: EntryMigrations = {};

/**
 * Brings an entry's parts from `from` to `to`.
 *
 * @throws Error when a step is missing: a release that forgot its migration
 */
export function migrateParts(
  kind: string,
  parts: EntryParts,
  from: number,
  to: number,
  migrations: EntryMigrations = entryMigrations,
): EntryParts {
  let current = parts;
  const steps = Object.hasOwn(migrations, kind) ? migrations[kind]! : [];
  for (let version = from; version < to; version += 1) {
    const step = steps[version - 1];
    if (!step) throw new Error(`no migration of ${kind} from version ${version}`);
    current = step(current);
  }
  return current;
}
