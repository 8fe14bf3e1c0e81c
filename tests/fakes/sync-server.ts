import type { LogEntry, StandingEntry } from '@/lib/domain/build/entry';
import { foldEntries } from '@/lib/domain/build/fold';
import { readEntry } from '@/lib/domain/build/read-entry';
import { assignStamp } from '@/lib/domain/build/stamp';
import { logPushSchema, PAGE_ENTRIES, type LogAnswer } from '@/lib/domain/build/wire';
import { uuidOf } from '../support/log';

/** What the line does to one request. */
export type Trouble =
  'lost-request' | 'lost-answer' | 'wifi-page' | 'signed-out' | 'wrong-account' | 'busy' | 'too-large' | null;

/**
 * A server in memory that judges, stamps and orders with the real domain functions. The test says what happens to each
 * request on the line.
 */
export class FakeSyncServer {
  readonly log: StandingEntry[] = [];
  readonly photos = new Map<string, number>();
  epoch = uuidOf(0xe1);
  now = 1_000_000;
  /** Ids that this server refuses. */
  readonly refuses = new Set<string>();
  mostBytes = Infinity;
  requests = 0;
  trouble: () => Trouble = () => null;

  readonly fetch = async (url: string, init: RequestInit = {}): Promise<Response> => {
    this.requests += 1;
    this.now += 10;
    const trouble = this.trouble();
    if (trouble === 'lost-request') throw new TypeError('network');
    if (trouble === 'wifi-page')
      return new Response('<html>Sign in to the Wi-Fi</html>', {
        status: 200,
        headers: { 'content-type': 'text/html' },
      });
    if (trouble === 'signed-out') return problem(401, 'sign-in-needed');
    if (trouble === 'wrong-account') return problem(403, 'wrong-account');
    if (trouble === 'busy') return problem(503, 'away', { 'retry-after': '7' });
    if (trouble === 'too-large') return problem(413, 'too-large');
    const answer = url.includes('/photos/') ? this.takePhoto(url, init) : this.takeLog(init);
    if (trouble === 'lost-answer') throw new TypeError('network');
    return answer;
  };

  /** Comes back from a backup made when the log had `length` entries. */
  restore(length: number): void {
    this.log.length = length;
    this.photos.clear();
    this.epoch = uuidOf(Number.parseInt(this.epoch.slice(-6), 16) + 1);
  }

  state() {
    return foldEntries(this.log);
  }

  private takePhoto(url: string, init: RequestInit): Response {
    const sha256 = url.split('/').at(-1)!;
    const bytes = (init.body as ArrayBuffer).byteLength;
    this.photos.set(sha256, bytes);
    return Response.json({ format: 'holdfast-photo', sha256, bytes, stored: true });
  }

  private takeLog(init: RequestInit): Response {
    const text = String(init.body);
    if (text.length > this.mostBytes) return problem(413, 'too-large');
    const push = logPushSchema.parse(JSON.parse(text));
    const buildId = String((push.entries[0]?.buildId as string | undefined) ?? this.buildId);
    const answer: LogAnswer = {
      format: 'holdfast-log',
      epoch: this.epoch,
      buildId,
      serverTime: this.now,
      accepted: [],
      refused: [],
      entries: [],
      cursor: push.cursor,
      more: false,
    };
    for (const raw of push.entries) {
      const known = this.log.find(({ id }) => id === raw.id);
      if (known) {
        answer.accepted.push({ id: raw.id, position: known.position!, stamp: known.stamp });
        continue;
      }
      const read = readEntry(raw);
      if (!read.ok || this.refuses.has(raw.id)) {
        answer.refused.push({
          id: raw.id,
          code: read.ok ? 'not-allowed' : read.code,
          message: read.ok ? 'You are no longer of the crew of this build.' : read.message,
        });
        continue;
      }
      const standing = this.stand(read.entry, push.accountId, push.sentAt);
      this.log.push(standing);
      answer.accepted.push({ id: raw.id, position: standing.position!, stamp: standing.stamp });
    }
    const after = this.log.filter(({ position }) => position! > push.cursor);
    answer.entries = after.slice(0, PAGE_ENTRIES) as unknown as LogAnswer['entries'];
    answer.cursor = answer.entries.at(-1)?.position ?? push.cursor;
    answer.more = after.length > PAGE_ENTRIES;
    return Response.json(answer);
  }

  /** Build that a request with no entries is about. */
  buildId = '';

  private stand(entry: LogEntry, accountId: string, sentAt: number): StandingEntry {
    const greatest = (rows: StandingEntry[]) =>
      rows.reduce<number | null>((most, { stamp }) => Math.max(most ?? stamp, stamp), null);
    const stamp = assignStamp({
      madeAt: entry.madeAt,
      clockOffsetMs: this.now - sentAt,
      receivedAt: this.now,
      seenStamp: greatest(this.log.filter(({ position }) => position! <= entry.seen)),
      previousStamp: greatest(this.log.filter(({ deviceId }) => deviceId === entry.deviceId)),
    });
    return { ...entry, accountId, stamp, position: this.log.length + 1 } as StandingEntry;
  }
}

function problem(status: number, code: string, headers: Record<string, string> = {}): Response {
  return new Response(
    JSON.stringify({
      type: `urn:holdfast:problem:${code}`,
      title: code,
      status,
      code,
      detail: `The server says ${code}.`,
    }),
    {
      status,
      headers: { 'content-type': 'application/problem+json', ...headers },
    },
  );
}
