import { allowed, hidden, refused, type Verdict } from './verdict';

export type PlanAct = 'read' | 'export' | 'start-build' | 'revise' | 'publish' | 'delete';

/** What is known of a plan and of who asks. */
export interface PlanFacts {
  visibility: 'private' | 'public';
  ownerAccountId: string;
  /** null for someone who is not signed in */
  accountId: string | null;
  /** The person builds or looks on at a build from this plan, and keeps what they started from. */
  onBuild?: boolean;
}

const isOwner = (facts: PlanFacts) => facts.accountId !== null && facts.accountId === facts.ownerAccountId;
const isReader = (facts: PlanFacts) => facts.visibility === 'public' || isOwner(facts) || facts.onBuild === true;

/** Who may do what with a plan, one line a fact. */
const rules: Record<PlanAct, (facts: PlanFacts) => boolean> = {
  read: isReader,
  export: isReader,
  'start-build': (facts) => facts.accountId !== null && isReader(facts),
  revise: isOwner,
  publish: isOwner,
  delete: isOwner,
};

/** Whether someone may do this with a plan. A plan that they may not read is not there for them. */
export function mayOnPlan(act: PlanAct, facts: PlanFacts): Verdict {
  if (rules[act](facts)) return allowed;
  if (!isReader(facts)) return hidden('There is no such plan, or it is not yours to see.');
  return refused(
    act === 'start-build' ? 'Sign in to start a build from this plan.' : 'Only the owner of this plan can change it.',
  );
}
