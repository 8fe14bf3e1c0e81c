import { readFileSync } from 'node:fs';
import { beforeEach, describe, expect, it } from 'vitest';
import type { Account } from '@/lib/server/auth/read-session';
import { exportPlan } from '@/lib/server/commands/export-plan';
import { importPlan } from '@/lib/server/commands/import-plan';
import { startBuild } from '@/lib/server/commands/start-build';
import { listPlans } from '@/lib/server/queries/plans';
import { makeAccount } from '../../support/accounts';
import { useDatabase } from '../../support/database';

useDatabase();
const file = readFileSync('plans/hall-bench.json', 'utf8');

interface WithDrawing {
  attachments: { content?: string; mediaType: string; bytes: number }[];
}
const parsed = () => JSON.parse(file) as WithDrawing;
const refusedAt = (path: string) => ({ code: 'invalid', extra: { problems: [{ path }] } });

let author: Account;
beforeEach(async () => {
  author = await makeAccount();
});

describe('plans in and out', () => {
  it('the same file gives the same revision, a changed one the next', async () => {
    const first = await importPlan(author, file);
    expect(first).toMatchObject({ number: 1, isNew: true });
    expect(await importPlan(author, file)).toEqual({ ...first, isNew: false });
    const changed = file.replace('A bench to put your shoes on', 'A bench for boots');
    expect(await importPlan(author, changed)).toMatchObject({ planId: first.planId, number: 2, isNew: true });
  });

  it('the order of fields and the blanks of a file make no new revision', async () => {
    const first = await importPlan(author, file);
    const turned = Object.fromEntries(Object.entries(parsed()).reverse());
    expect(await importPlan(author, JSON.stringify(turned))).toEqual({ ...first, isNew: false });
  });

  it('two imports of one person at once number their revisions one after the other', async () => {
    const texts = ['oak', 'ash', 'beech', 'elm'].map((wood) => file.replace('A bench', `A bench of ${wood}`));
    const imported = await Promise.all(texts.map((text) => importPlan(author, text)));
    expect(imported.map(({ number }) => number).sort()).toEqual([1, 2, 3, 4]);
    expect(new Set(imported.map(({ planId }) => planId)).size).toBe(1);
  });

  it('what was exported imports to the same content, drawings and all', async () => {
    const first = await importPlan(author, file);
    const { text, fileName } = await exportPlan(author, first.planId);
    expect(fileName).toBe('hall-bench.json');
    expect((JSON.parse(text) as WithDrawing).attachments).toEqual(parsed().attachments);
    expect((await importPlan(author, text)).contentHash).toBe(first.contentHash);
    const other = await makeAccount();
    expect(await importPlan(other, text)).toMatchObject({ contentHash: first.contentHash, number: 1, isNew: true });
  });

  it('another’s private plan is neither listed nor built nor saved as a file', async () => {
    const { planId } = await importPlan(author, file);
    const other = await makeAccount();
    expect(await listPlans(other.id)).toEqual([]);
    await expect(startBuild(other, planId, 'Mine')).rejects.toMatchObject({ code: 'not-found' });
    await expect(exportPlan(other, planId)).rejects.toMatchObject({ code: 'not-found' });
  });
});

describe('a drawing in a plan file', () => {
  it('whose bytes are not what they say is refused by its path', async () => {
    const plan = parsed();
    plan.attachments[0]!.content = Buffer.from('not a drawing').toString('base64');
    await expect(importPlan(author, plan)).rejects.toMatchObject(refusedAt('attachments[0].content'));
  });

  it('that is of another kind than it says is refused by its path', async () => {
    const plan = parsed();
    plan.attachments[0]!.mediaType = 'image/jpeg';
    await expect(importPlan(author, plan)).rejects.toMatchObject(refusedAt('attachments[0].content'));
  });

  it('may be left out by whoever has it already, and is not to be had by naming its hash', async () => {
    const plan = parsed();
    delete plan.attachments[0]!.content;
    await expect(importPlan(author, plan)).rejects.toMatchObject(refusedAt('attachments[0].content'));
    await importPlan(author, file);
    expect(await importPlan(author, plan)).toMatchObject({ isNew: false });
    await expect(importPlan(await makeAccount(), plan)).rejects.toMatchObject(refusedAt('attachments[0].content'));
  });
});
