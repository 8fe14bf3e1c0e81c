import type { FormattedLength } from '../measure';
import { findPart, findStep, stepNumber } from '../plan/find';
import type { PlanDocument } from '../plan/document';
import type { LogEntry } from './entry';
import { isKnown, toPresentShape } from './present-shape';

export interface DescribeOptions {
  /** Formats a length in the person's own units. */
  formatLength: (length: number) => Pick<FormattedLength, 'text'>;
}

/**
 * What an entry says, in plain words of the trade: "Step 14, Cut the four half laps, ticked". An entry of a later
 * program says so.
 */
export function describeEntry(raw: LogEntry, plan: PlanDocument, { formatLength }: DescribeOptions): string {
  if (!isKnown(raw)) return 'An entry of a newer version of Holdfast';
  const entry = toPresentShape(raw);
  const step = (id: string | null | undefined) => {
    const found = id ? findStep(plan, id) : undefined;
    return found ? `Step ${stepNumber(plan, found.id)}, ${found.title}` : 'A step of another revision';
  };
  const at = (id: string | null) => (id && findStep(plan, id) ? ` at step ${stepNumber(plan, id)}` : '');
  switch (entry.kind) {
    case 'step-marked': {
      const { mark, reason, passedLocks } = entry.value;
      const said = { done: 'ticked', skipped: 'skipped', open: 'opened again' }[mark];
      const passed =
        passedLocks.length > 0 ? `, past ${passedLocks.map(({ lock }) => lockWords[lock]).join(' and ')}` : '';
      return `${step(entry.target.stepId)}, ${said}${passed}${reason ? `: ${reason}` : ''}`;
    }
    case 'piece-marked': {
      const part = findPart(plan, entry.target.partId);
      const name = part ? `${part.label} ${part.name}` : entry.target.partId;
      const of = part && part.quantity > 1 ? `, piece ${entry.target.piece} of ${part.quantity}` : '';
      return `${name}${of}, ${entry.value.mark === 'cut' ? 'cut' : 'not cut after all'}`;
    }
    case 'timer-marked':
      return `${timerWords[entry.target.event]}, ${step(entry.value.stepId).replace(/^[SA]/, (first) => first.toLowerCase())}`;
    case 'key-size-set': {
      const size = plan.keySizes.find(({ id }) => id === entry.target.keySizeId);
      const { length } = entry.value;
      const where = entry.target.stockPiece === null ? '' : ` of ${entry.target.stockPiece}`;
      return `${size?.name ?? entry.target.keySizeId}${where} ${length === null ? 'set back to the plan' : `taken as ${formatLength(length).text}`}`;
    }
    case 'measurement-taken':
      return `${entry.value.what}: ${formatLength(entry.value.length).text}${at(entry.value.stepId)}`;
    case 'measurement-revised':
      return `Measurement changed: ${entry.value.what}: ${formatLength(entry.value.length).text}`;
    case 'check-recorded': {
      const check = findStep(plan, entry.target.stepId)?.checks.find(({ id }) => id === entry.target.checkId);
      const { verdict, reason, readings } = entry.value;
      const read = readings.map((length) => formatLength(length).text).join(' and ');
      return `Check ${check?.what ?? entry.target.checkId}: ${read ? `${read}, ` : ''}${checkWords[verdict]}${reason ? `: ${reason}` : ''}`;
    }
    case 'note-written':
      return `${noteWords[entry.value.about]}${at(entry.value.stepId)}: ${entry.value.text}`;
    case 'note-revised':
      return `Note changed: ${entry.value.text}`;
    case 'photo-taken':
      return `Photo${at(entry.value.stepId)}${entry.value.caption ? `: ${entry.value.caption}` : ''}`;
    case 'photo-captioned':
      return entry.value.caption ? `Photo named: ${entry.value.caption}` : 'Photo’s caption taken off';
    case 'departure-recorded':
      return `Departure${at(entry.value.stepId)}: ${entry.value.what}${entry.value.why ? ` — ${entry.value.why}` : ''}`;
    case 'departure-revised':
      return `Departure changed: ${entry.value.what}`;
    case 'item-removed':
      return `A ${itemWords[entry.target.collection]} was ${entry.value.removed ? 'taken out' : 'put back'}`;
    case 'entry-undone':
      return entry.value.undone ? 'Undid an entry' : 'Took an undo back';
    case 'session-opened':
      return 'Work began';
    case 'session-closed':
      return `Closed down after ${entry.value.minutes} min${entry.value.firstNext ? `. First next time: ${entry.value.firstNext}` : ''}`;
  }
}

const lockWords = {
  order: 'the order',
  cure: 'glue not known to be cured',
  metal: 'metal in a cut’s way',
  clearance: 'a missing clearance',
  'measure-first': 'a size not yet measured',
} as const;
const timerWords = {
  'first-glue': 'First glue',
  'clamps-on': 'Clamps on',
  'clamps-off': 'Clamps off',
  'put-away': 'Timer put away',
} as const;
const checkWords = {
  within: 'within tolerance',
  outside: 'outside tolerance',
  accepted: 'accepted as it is',
  cleared: 'cleared',
} as const;
const noteWords = { note: 'Note', 'near-miss': 'Near miss', 'went-wrong': 'Went wrong' } as const;
const itemWords = { notes: 'note', measurements: 'measurement', photos: 'photo', departures: 'departure' } as const;
