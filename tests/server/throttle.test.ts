import { describe, expect, it } from 'vitest';
import { AppError } from '@/lib/server/errors';
import { forgetTries, limits, throttle } from '@/lib/server/throttle';
import { useDatabase } from '../support/database';

const database = useDatabase();
const { limit, windowS } = limits['letter:account'];

async function tries(count: number, subject: string): Promise<AppError[]> {
  const results = await Promise.allSettled(Array.from({ length: count }, () => throttle('letter:account', subject)));
  return results.flatMap((result) => (result.status === 'rejected' ? [result.reason as AppError] : []));
}

describe('throttle', () => {
  it('lets the limit through when many come at the same moment, and refuses each one past it', async () => {
    const refusals = await tries(limit + 7, 'at-once@example.org');
    expect(refusals).toHaveLength(7);
  });

  it('says how long to wait, in seconds and in words', async () => {
    const [refusal] = await tries(limit + 1, 'wait@example.org');
    expect(refusal?.code).toBe('too-many');
    expect(refusal?.extra.retryAfterS).toBeGreaterThan(windowS - 60);
    expect(refusal?.extra.retryAfterS).toBeLessThanOrEqual(windowS);
    expect(refusal?.detail).toMatch(/Wait 60 minutes/);
  });

  it('counts afresh once the window has ended, and a refused try does not move its end', async () => {
    const subject = 'window@example.org';
    await tries(limit + 5, subject);
    const ends = () => database().models.Throttle.findAll({ order: [['windowEndsAt', 'DESC']], limit: 1 });
    const [before] = await ends();
    await tries(1, subject);
    expect((await ends())[0]?.windowEndsAt).toEqual(before?.windowEndsAt);
    await database().sequelize.query(`update throttles set window_ends_at = now() - interval '1 second'`);
    expect(await tries(limit, subject)).toHaveLength(0);
    expect(await tries(1, subject)).toHaveLength(1);
  });

  it('keeps subjects and limits apart, and forgets on request', async () => {
    await tries(limit + 1, 'one@example.org');
    expect(await tries(1, 'two@example.org')).toHaveLength(0);
    await expect(throttle('sign-in:account', 'one@example.org')).resolves.toBeUndefined();
    await forgetTries('letter:account', 'one@example.org');
    expect(await tries(1, 'one@example.org')).toHaveLength(0);
  });

  it('stores no address in the clear', async () => {
    await throttle('letter:account', 'private@example.org');
    const rows = await database().models.Throttle.findAll();
    expect(rows.map((row) => row.key).join()).not.toContain('private');
  });
});
