import { createRoot, type Root } from 'react-dom/client';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { SignOut } from '@/components/account/sign-out';
import { openAccountDatabase, type AccountDatabase } from '@/lib/store/database';
import { enterAccount, getCurrentAccount, getKnownAccounts } from '@/lib/store/device-database';
import type { EntryRow } from '@/lib/store/rows';

const accountId = '0198f0a0-0000-7000-8000-0000000000a1';
const heldEntry = {
  id: '0198f0a0-0000-7000-8000-0000000000e1',
  buildId: '0198f0a0-0000-7000-8000-0000000000b1',
  deviceId: '0198f0a0-0000-7000-8000-0000000000d1',
  accountId,
  madeAt: 1,
  seen: 0,
  kind: 'note-written',
  v: 1,
  target: { noteId: '0198f0a0-0000-7000-8000-0000000000f1' },
  value: { text: 'The seat is proud by a hair.', stepId: null, about: 'note' },
  stamp: 1,
  position: null,
  sync: 'held',
} as EntryRow;
const asked: string[] = [];
let root: Root;
let page: HTMLElement;
let db: AccountDatabase;

const button = (name: string) => {
  const found = [...page.querySelectorAll('button')].find(({ textContent }) => textContent === name);
  if (!found) throw new Error(`no button ${name} in: ${page.textContent}`);
  return found;
};
const press = async (name: string) => {
  await vi.waitFor(() => expect(button(name).disabled).toBe(false));
  button(name).click();
};

beforeEach(async () => {
  asked.length = 0;
  vi.stubGlobal('fetch', async (path: string) => {
    asked.push(path);
    return path.endsWith('/csrf') ? Response.json({ csrfToken: 'x' }) : new Response(null, { status: 204 });
  });
  vi.spyOn(window.location, 'assign').mockImplementation(() => undefined);
  await enterAccount({ accountId, name: 'Ada', email: 'ada@example.org' }, 1);
  db = await openAccountDatabase(accountId);
  page = document.body.appendChild(document.createElement('div'));
  root = createRoot(page);
  root.render(<SignOut accountId={accountId} />);
});

afterEach(() => {
  root.unmount();
  page.remove();
  vi.restoreAllMocks();
  vi.unstubAllGlobals();
});

describe('signing out of this browser', () => {
  it('takes the account’s records along when everything was sent', async () => {
    await press('Sign out here');
    await vi.waitFor(() => expect(window.location.assign).toHaveBeenCalled());
    expect(asked).toEqual(['/api/auth/csrf', '/api/auth/signout']);
    expect(await getKnownAccounts()).toEqual([]);
    expect(await getCurrentAccount()).toBeNull();
  });

  it('says what is only here, signs nobody out unasked, and keeps it when asked to', async () => {
    await db.entries.add(heldEntry);
    await press('Sign out here');
    await vi.waitFor(() => expect(page.textContent).toContain('1 entry held here.'));
    expect(asked).toEqual([]);

    await press('Sign out, keep them here');
    await vi.waitFor(() => expect(window.location.assign).toHaveBeenCalled());
    expect(asked).toContain('/api/auth/signout');
    expect(await getCurrentAccount()).toBeNull();
    expect((await getKnownAccounts()).map((account) => account.accountId)).toEqual([accountId]);
    const again = await openAccountDatabase(accountId);
    expect(await again.entries.count()).toBe(1);
    await again.entries.clear();
  });

  it('stays signed in, with everything in place, when the server gives no answer', async () => {
    vi.stubGlobal('fetch', async () => {
      throw new TypeError('Failed to fetch');
    });
    await press('Sign out here');
    await vi.waitFor(() => expect(page.textContent).toContain('Not signed out.'));
    expect(window.location.assign).not.toHaveBeenCalled();
    expect((await getCurrentAccount())?.accountId).toBe(accountId);
  });
});
