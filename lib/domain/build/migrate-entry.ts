/** What a kind's version decides the shape of. */
export interface EntryParts {
  target: Record<string, unknown>;
  value: Record<string, unknown>;
}

/**
 * Steps from one version of a kind's shape to the next, by kind. The step at index n turns version n + 1 into n + 2.
 * A released version is never taken out: a phone may have been away for months (rule S6). A step is given parts that
 * nobody has judged yet, so it moves and renames fields and leaves the judging to the shape.
 */
export type EntryMigrations = Readonly<Record<string, readonly ((parts: EntryParts) => EntryParts)[]>>;

export const entryMigrations: EntryMigrations = {};

/**
 * Brings an entry's parts from version `from` to version `to`. Parts that are no objects are no entry of any version
 * and come back as they are.
 *
 * @throws Error when a step is missing: a release that forgot its migration
 */
export function migrateParts(
  kind: string,
  parts: { target: unknown; value: unknown },
  from: number,
  to: number,
  migrations: EntryMigrations = entryMigrations,
): { target: unknown; value: unknown } {
  if (from === to || !isRecord(parts.target) || !isRecord(parts.value)) return parts;
  const steps = Object.hasOwn(migrations, kind) ? migrations[kind]! : [];
  let current: EntryParts = { target: parts.target, value: parts.value };
  for (let version = from; version < to; version += 1) {
    const step = steps[version - 1];
    if (!step) throw new Error(`no migration of ${kind} from version ${version}`);
    current = step(current);
  }
  return current;
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
