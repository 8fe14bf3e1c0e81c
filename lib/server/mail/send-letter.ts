import 'server-only';
import { createTransport } from 'nodemailer';
import { env } from '../env';
import type { AddressedLetter } from './compose-letter';

const SMTP_TIMEOUT_MS = 15_000;

export type SendingResult = { ok: true } | { ok: false; code: 'refused-for-good' | 'try-later'; reason: string };

/**
 * Hands one letter to the mail server (SMTP_URL). A 5xx answer about the recipient or the letter is for good (RFC 5321,
 * 4.2.1). Anything else is worth another try: no connection, or a name, password or sender that the server does not take,
 * which someone will put right.
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
    const reason = error instanceof Error ? error.message : String(error);
    return { ok: false, code: isForGood(error) ? 'refused-for-good' : 'try-later', reason };
  } finally {
    transport.close();
  }
}

/** nodemailer names the stage in `code`, the server's answer in `responseCode`, and a refused recipient in `rejected`. */
function isForGood(error: unknown): boolean {
  const { code, responseCode = 0, rejected = [] } = error as SmtpFailure;
  return responseCode >= 500 && (code === 'EMESSAGE' || (code === 'EENVELOPE' && rejected.length > 0));
}

interface SmtpFailure {
  code?: string;
  responseCode?: number;
  rejected?: string[];
}
