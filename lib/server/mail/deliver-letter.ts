import 'server-only';
import { log } from '../log';
import { composeLetter } from './compose-letter';
import { letterOrder } from './letter-order';
import { sendLetter } from './send-letter';

/**
 * One job of the mail queue: writes the letter and hands it to the mail server.
 *
 * @throws Error when it is worth another try; the queue sees to that
 */
export async function deliverLetter(order: unknown): Promise<void> {
  const parsed = letterOrder.parse(order);
  const addressed = await composeLetter(parsed);
  if (!addressed) return;
  const sent = await sendLetter(addressed);
  if (sent.ok) return;
  if (sent.code === 'try-later') throw new Error(`The mail server did not take the letter: ${sent.reason}`);
  log.warn({ letter: parsed.letter, reason: sent.reason }, 'the mail server refused a letter for good');
}
