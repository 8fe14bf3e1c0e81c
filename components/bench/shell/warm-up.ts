import { openAccountDatabase } from '@/lib/store/database';
import { getCurrentAccount } from '@/lib/store/device-database';
import { getBuild, getPlan } from '@/lib/store/queries/builds';
import type { BuildRow } from '@/lib/store/rows';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { readAddress } from './address';

export interface WarmBuild {
  accountId: string;
  build: BuildRow;
  plan: PlanDocument;
}

let warm: WarmBuild | null = null;

/**
 * Opens the phone's storage and reads the build of the address while the page is still coming alive, so that its first
 * screen waits for neither. What fails here fails again where it is asked for, and is said there.
 */
export async function warmUp(search: string): Promise<void> {
  try {
    const account = await getCurrentAccount();
    if (!account) return;
    const db = await openAccountDatabase(account.accountId);
    const { buildId } = readAddress(new URLSearchParams(search));
    const build = buildId ? await getBuild(db, buildId) : undefined;
    const plan = build && (await getPlan(db, build.contentHash));
    if (build && plan) warm = { accountId: account.accountId, build, plan };
  } catch (error) {
    console.warn('The bench was not read ahead.', error);
  }
}

/** The build as it was read ahead: once, for the first screen alone, since it is not kept up to date. */
export function takeWarm(accountId: string, buildId: string): WarmBuild | null {
  const taken = warm?.accountId === accountId && warm.build.id === buildId ? warm : null;
  warm = null;
  return taken;
}
