import 'server-only';
import { createTransport } from 'nodemailer';
import { env } from '../env';
import type { AddressedLetter } from './compose-letter';

const SMTP_TIMEOUT_MS = 15_000;

export type SendingResult = { ok: true } | { ok: false; code: 'refused-for-good' | 'try-later'; reason: string };

/**
 * Hands one letter to the mail server (SMTP_URL). A 5xx answer is for good (RFC 5321, 4.2.1); anything else, no connection
 * included, is worth another try.
 */
export async function sendLetter({ to, letter }: AddressedLetter): Promise<SendingResult> {
  const transport = createTransport({
    url: env().SMTP_URL,
    connectionTimeout: SMTP_TIMEOUT_MS,
    greetingTimeout: SMTP_TIMEOUT_MS,
    socketTimeout: SMTP_TIMEOUT_MS,
  });
  try {
    await transport.sendMail({
      from: env().MAIL_FROM,
      to: { name: '', address: to },
      subject: letter.subject,
      text: letter.text,
      html: letter.html,
      // RFC 3834: keeps out-of-office answers from coming back.
      headers: { 'Auto-Submitted': 'auto-generated' },
    });
    return { ok: true };
  } catch (error) {
    const responseCode = (error as { responseCode?: number }).responseCode ?? 0;
    const reason = error instanceof Error ? error.message : String(error);
    return { ok: false, code: responseCode >= 500 ? 'refused-for-good' : 'try-later', reason };
  } finally {
    transport.close();
  }
}
