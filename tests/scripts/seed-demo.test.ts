import { describe, expect, it } from 'vitest';
import { findPart, findStep } from '@/lib/domain/plan/find';
import { listBuilds, findBuild } from '@/lib/server/queries/builds';
import { readBuildLog } from '@/lib/server/queries/build-log';
import { listPlans } from '@/lib/server/queries/plans';
import { demoLog } from '@/scripts/demo-log';
import { demoSignIns } from '@/scripts/demo.mjs';
import { seedDemo } from '@/scripts/seed-demo';
import { useDatabase } from '../support/database';

const database = useDatabase();
const NOW = 1_800_000_000_000;

async function builder() {
  const { Account } = database().models;
  return Account.findOne({ where: { email: demoSignIns[0]!.email }, rejectOnEmpty: true });
}

describe('the demo', () => {
  it('is put in once, and what was cut short is made good', async () => {
    await database().models.Account.create({ ...demoSignIns[0]!, role: 'member', passwordHash: 'own' });
    expect(await seedDemo(NOW)).toBe(true);
    expect(await seedDemo(NOW)).toBe(false);
    expect((await builder()).passwordHash).toBe('own');
    expect(await listPlans((await builder()).id)).toMatchObject([{ visibility: 'public' }, { visibility: 'public' }]);
    expect(await listBuilds((await builder()).id)).toHaveLength(1);
  });

  it('shows a build under way, by entries that the log took and that the plan knows', async () => {
    await seedDemo(NOW);
    const [row] = await listBuilds((await builder()).id, NOW);
    const { buildId, deviceId } = (await readBuildLog(row!.id))[0]!;
    const made = demoLog({ buildId, deviceId, now: NOW });
    expect((await readBuildLog(buildId)).map(({ kind, madeAt }) => [kind, madeAt])).toEqual(
      made.map(({ kind, madeAt }) => [kind, madeAt]),
    );
    const { plan } = (await findBuild(buildId))!;
    for (const entry of made) {
      if (entry.kind === 'step-marked') expect(findStep(plan, entry.target.stepId)).toBeDefined();
      if (entry.kind === 'piece-marked') {
        expect(findPart(plan, entry.target.partId)!.quantity).toBeGreaterThanOrEqual(entry.target.piece);
      }
      if (entry.kind === 'key-size-set') {
        const size = plan.keySizes.find(({ id }) => id === entry.target.keySizeId)!;
        expect(entry.value.length).toBeGreaterThanOrEqual(size.range!.min);
        expect(entry.value.length).toBeLessThanOrEqual(size.range!.max);
      }
    }
    expect(row!.progress).toMatchObject({ stepsDone: 6, piecesCut: 7, minutesWorked: 205 });
  });
});
