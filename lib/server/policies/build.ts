import { allowed, hidden, refused, type Verdict } from './verdict';

export type CrewRole = 'owner' | 'helper' | 'onlooker';

export type BuildAct =
  | 'read'
  | 'read-log'
  | 'take-to-bench'
  | 'read-photo'
  | 'append-log'
  | 'add-photo'
  | 'rename'
  | 'close'
  | 'manage-crew'
  | 'delete';

/** Who may do what on a build, one line a fact. */
const facts: Record<BuildAct, readonly CrewRole[]> = {
  read: ['owner', 'helper', 'onlooker'],
  'read-log': ['owner', 'helper', 'onlooker'],
  'take-to-bench': ['owner', 'helper', 'onlooker'],
  'read-photo': ['owner', 'helper', 'onlooker'],
  'append-log': ['owner', 'helper'],
  'add-photo': ['owner', 'helper'],
  rename: ['owner'],
  close: ['owner'],
  'manage-crew': ['owner'],
  delete: ['owner'],
};

/**
 * Whether someone may do this on a build. Where they are not of its crew the build is not there for them, so that
 * nobody learns by trying which builds exist.
 *
 * @param role  the person's role in the build's crew at this moment; null for none, and for one who was removed
 */
export function mayOnBuild(act: BuildAct, role: CrewRole | null): Verdict {
  if (role === null) return hidden('There is no such build, or you are not of its crew.');
  if (facts[act].includes(role)) return allowed;
  return refused(
    role === 'onlooker'
      ? 'You look on at this build: you can see it, and change nothing. Its owner can make you a helper.'
      : 'Only the owner of this build can do that.',
  );
}
