import { describe, expect, it } from 'vitest';
import { mayOnBuild, type BuildAct, type CrewRole } from '@/lib/server/policies/build';
import { mayOnPlan, type PlanAct, type PlanFacts } from '@/lib/server/policies/plan';

const buildActs: BuildAct[] = [
  'read',
  'read-log',
  'take-to-bench',
  'read-photo',
  'append-log',
  'add-photo',
  'rename',
  'close',
  'manage-crew',
  'delete',
];
const mayDo = (role: CrewRole | null) => buildActs.filter((act) => mayOnBuild(act, role).ok);

describe('on a build', () => {
  it('its owner may do everything', () => {
    expect(mayDo('owner')).toEqual(buildActs);
  });
  it('a helper may read it, work on it and add photos', () => {
    expect(mayDo('helper')).toEqual(['read', 'read-log', 'take-to-bench', 'read-photo', 'append-log', 'add-photo']);
  });
  it('an onlooker may read it and nothing else', () => {
    expect(mayDo('onlooker')).toEqual(['read', 'read-log', 'take-to-bench', 'read-photo']);
    expect(mayOnBuild('append-log', 'onlooker')).toMatchObject({ ok: false, code: 'not-allowed' });
  });
  it('for anyone else it is not there', () => {
    expect(mayDo(null)).toEqual([]);
    for (const act of buildActs) expect(mayOnBuild(act, null)).toMatchObject({ code: 'not-found' });
  });
});

const planActs: PlanAct[] = ['read', 'export', 'start-build', 'revise', 'publish', 'delete'];
const mayWith = (facts: Omit<PlanFacts, 'ownerAccountId'>) =>
  planActs.filter((act) => mayOnPlan(act, { ownerAccountId: 'owner', ...facts }).ok);

describe('with a plan', () => {
  it('its owner may do everything, public or not', () => {
    expect(mayWith({ visibility: 'private', accountId: 'owner' })).toEqual(planActs);
    expect(mayWith({ visibility: 'public', accountId: 'owner' })).toEqual(planActs);
  });
  it('anyone may read and export a public one, and build from it once signed in', () => {
    expect(mayWith({ visibility: 'public', accountId: null })).toEqual(['read', 'export']);
    expect(mayWith({ visibility: 'public', accountId: 'other' })).toEqual(['read', 'export', 'start-build']);
  });
  it('a private one is there for those who build from it, and for nobody else', () => {
    expect(mayWith({ visibility: 'private', accountId: 'other', onBuild: true })).toContain('read');
    expect(mayWith({ visibility: 'private', accountId: 'other' })).toEqual([]);
    expect(mayOnPlan('revise', { visibility: 'private', ownerAccountId: 'owner', accountId: 'other' })).toMatchObject({
      code: 'not-found',
    });
    expect(mayOnPlan('revise', { visibility: 'public', ownerAccountId: 'owner', accountId: 'other' })).toMatchObject({
      code: 'not-allowed',
    });
  });
});
