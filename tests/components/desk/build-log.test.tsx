import { act } from 'react';
import { createRoot, type Root } from 'react-dom/client';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { BuildLog } from '@/components/desk/build-log';
import { hours, hoursRange } from '@/components/desk/hours';
import { ProgressRule } from '@/components/desk/progress-rule';
import { ACCOUNT, BUILD, entry, uuidOf } from '../../support/log';
import { demoPlan } from '../../support/plans';

let root: Root;
let page: HTMLElement;
const plan = demoPlan('folding-trestles');
const DAY = 86_400_000;

beforeEach(() => {
  page = document.body.appendChild(document.createElement('main'));
  root = createRoot(page);
});
afterEach(async () => {
  vi.restoreAllMocks();
  await act(async () => root.unmount());
  page.remove();
});
const draw = (node: React.ReactNode) => act(async () => root.render(node));

const note = (text: string, madeAt: number) =>
  entry('note-written', { noteId: uuidOf(0x900 + madeAt) }, { text, stepId: null }, { madeAt });
const photo = entry(
  'photo-taken',
  { photoId: uuidOf(0x901) },
  { stepId: null, wantedId: null, sha256: 'a'.repeat(64), bytes: 3, mediaType: 'image/jpeg', width: 1, height: 1 },
  { madeAt: 30 * DAY },
);

describe('the log at the desk', () => {
  it('stands by day, newest day first, with who did it', async () => {
    const entries = [note('first evening', 10 * DAY), note('second evening', 12 * DAY)];
    await draw(<BuildLog buildId={BUILD} entries={entries} plan={plan} names={{ [ACCOUNT]: 'Ash' }} />);
    expect([...page.querySelectorAll('h3')].map(({ textContent }) => textContent)).toEqual([
      'Tuesday, January 13, 1970',
      'Sunday, January 11, 1970',
    ]);
    expect(page.querySelectorAll('li')[0]!.textContent).toContain('second evening');
    expect(page.textContent).toContain('· Ash');
  });

  it('keeps what was undone, and says so', async () => {
    const wrong = note('wrong bench', 10 * DAY);
    const undo = entry('entry-undone', { entryId: wrong.id }, { undone: true }, { madeAt: 10 * DAY + 1 });
    await draw(<BuildLog buildId={BUILD} entries={[wrong, undo]} plan={plan} names={{}} />);
    expect(page.querySelectorAll('li')).toHaveLength(1);
    expect(page.textContent).toContain('· undone');
  });

  it('says of a photo that is not here yet where it is', async () => {
    // The stand-in for a browser loads no pictures, and calls each complete from the start.
    vi.spyOn(HTMLImageElement.prototype, 'complete', 'get').mockReturnValue(false);
    await draw(<BuildLog buildId={BUILD} entries={[photo]} plan={plan} names={{}} />);
    const image = page.querySelector('img')!;
    expect(image.getAttribute('src')).toBe(`/api/builds/${BUILD}/photos/${'a'.repeat(64)}`);
    await act(async () => image.dispatchEvent(new Event('error')));
    expect(page.querySelector('img')).toBeNull();
    expect(page.textContent).toContain('held on the phone that took it');
  });

  it('with nothing in it says how something comes there', async () => {
    await draw(<BuildLog buildId={BUILD} entries={[]} plan={plan} names={{}} />);
    expect(page.textContent).toContain('Take the build to the bench');
  });
});

describe('how far a build is', () => {
  it('is a rule with one graduation a step, by stage', async () => {
    const stages = [
      { stageId: 'wood', done: 2, skipped: 1, inAll: 4 },
      { stageId: 'finish', done: 1, skipped: 0, inAll: 2 },
    ];
    await draw(<ProgressRule stages={stages} />);
    const marks = [...page.querySelectorAll('path')].slice(1);
    expect(marks.map((mark) => mark.getAttribute('stroke-width'))).toEqual(['4', '4', '1', '1', '4', '1']);
    expect(marks.map((mark) => mark.hasAttribute('stroke-dasharray'))).toEqual([
      false,
      false,
      true,
      false,
      false,
      false,
    ]);
  });

  it.each([
    [45, '45 min'],
    [60, '1 h'],
    [200, '3 h 20 min'],
    [0, '0 min'],
  ])('%i minutes are %s', (minutes, words) => expect(hours(minutes)).toBe(words));

  it.each([
    [{ min: 245, max: 385 }, '4–6 h'],
    [{ min: 20, max: 40 }, '20–40 min'],
    [{ min: 30, max: 30 }, '30 min'],
    [{ min: 170, max: 190 }, '3 h'],
  ])('a range of %o is %s', (range, words) => expect(hoursRange(range)).toBe(words));
});
