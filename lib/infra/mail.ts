import 'server-only';
import { createTransport, type Transporter } from 'nodemailer';
import type SMTPPool from 'nodemailer/lib/smtp-pool';
import { env } from './env';

/** A calendar in a letter: an invitation that mail programs act on, or a plain file beside the letter. */
export type MailCalendar = { method: 'PUBLISH' | 'REQUEST' | 'CANCEL'; fileName: string; content: string };

/** One letter, ready to go. Subject and names are single lines already. */
export type Mail = {
  /** Made from the letter's key: the same letter sent twice has the same Message-ID. */
  messageId: string;
  from: { name: string; address: string };
  to: { name: string; address: string };
  subject: string;
  html: string;
  text: string;
  calendar: MailCalendar | null;
};

const keep = globalThis as { leafhaltMail?: { url: string; transporter: Transporter<SMTPPool.SentMessageInfo> } };

/** One pool of connections a process to the mail server of the environment. */
function transporter(): Transporter<SMTPPool.SentMessageInfo> {
  const url = env().SMTP_URL;
  if (keep.leafhaltMail?.url !== url) {
    keep.leafhaltMail?.transporter.close();
    const waits = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 30_000 };
    const options: SMTPPool.Options = { url, pool: true, maxConnections: 3, disableFileAccess: true, disableUrlAccess: true, ...waits };
    keep.leafhaltMail = { url, transporter: createTransport(options) };
  }
  return keep.leafhaltMail.transporter;
}

/** Hands one letter to the mail server; resolves when the server has taken it, throws when it has not. */
export async function sendMail({ messageId, from, to, subject, html, text, calendar }: Mail): Promise<void> {
  const file = calendar && { filename: calendar.fileName, content: calendar.content, contentType: `text/calendar; charset=utf-8; method=${calendar.method}` };
  const isInvitation = calendar !== null && calendar.method !== 'PUBLISH';
  await transporter().sendMail({
    messageId, from, to, subject, html, text,
    headers: { 'Auto-Submitted': 'auto-generated' }, // RFC 3834 section 5: no holiday answers, please
    // The part that mail programs act on (RFC 6047 section 2.4); one UID, so one part and the same file to keep.
    ...(isInvitation && file && { alternatives: [{ content: file.content, contentType: `${file.contentType}; component=VEVENT`, contentTransferEncoding: 'base64' as const }] }),
    ...(file && { attachments: [isInvitation ? { ...file, contentType: 'application/ics' } : file] }),
  });
}

/** Closes the pool, so that a process can end. */
export function closeMail(): void {
  keep.leafhaltMail?.transporter.close();
  delete keep.leafhaltMail;
}

/** What the mail server said, for the office's list: its code and words, without anybody's address. */
export function mailFailure(error: unknown): string {
  if (!(error instanceof Error)) return 'The mail server did not take it.';
  const answer = 'response' in error && typeof error.response === 'string' ? error.response : error.message;
  return answer.replace(/[^\s<>"]+@[^\s<>"]+/g, '(address)').replace(/\s+/g, ' ').slice(0, 300);
}
