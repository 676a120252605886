// The letters that arrived, newest first, kept as the raw messages so that a restart shows them again.
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { simpleParser, type AddressObject, type ParsedMail } from 'mailparser';

const KEPT = 500;

export type Part = { name: string; type: string; method: string | null; text: string };
export type Letter = {
  id: number; at: string; from: string; to: string[]; subject: string; messageId: string; text: string; html: string; parts: Part[];
  headers: Record<string, string>; raw: string;
};

export class Letters {
  private kept: Letter[] = [];
  private last = 0;

  private constructor(private readonly folder: string | null) {}

  /** Reads what a folder holds; null keeps letters in memory alone. */
  static async open(folder: string | null): Promise<Letters> {
    const letters = new Letters(folder);
    if (!folder) return letters;
    mkdirSync(folder, { recursive: true });
    const names = readdirSync(folder).filter((name) => name.endsWith('.eml')).sort();
    for (const name of names) await letters.keep(Number.parseInt(name, 10), readFileSync(join(folder, name)));
    return letters;
  }

  /** A new letter, as the SMTP client sent it. */
  async arrive(raw: Buffer): Promise<Letter> {
    const id = (this.last += 1);
    if (this.folder) writeFileSync(join(this.folder, `${String(id).padStart(6, '0')}.eml`), raw);
    return this.keep(id, raw);
  }

  all(): Letter[] {
    return this.kept;
  }

  find(id: number): Letter | null {
    return this.kept.find((letter) => letter.id === id) ?? null;
  }

  clear() {
    for (const { id } of this.kept.splice(0)) this.forget(id);
  }

  private async keep(id: number, raw: Buffer): Promise<Letter> {
    const letter = toLetter(id, await simpleParser(raw, { skipImageLinks: true }), raw);
    this.last = Math.max(this.last, id);
    this.kept = [letter, ...this.kept].sort((a, b) => b.id - a.id);
    for (const old of this.kept.splice(KEPT)) this.forget(old.id);
    return letter;
  }

  private forget(id: number) {
    if (this.folder) rmSync(join(this.folder, `${String(id).padStart(6, '0')}.eml`), { force: true });
  }
}

function toLetter(id: number, mail: ParsedMail, raw: Buffer): Letter {
  return {
    id, at: (mail.date ?? new Date()).toISOString(), from: mail.from?.text ?? '', to: addresses(mail.to), subject: mail.subject ?? '(no subject)',
    messageId: mail.messageId ?? '', text: mail.text ?? '', html: mail.html || '',
    parts: mail.attachments.map((part) => ({
      name: part.filename ?? (part.contentType === 'text/calendar' ? 'invite.ics' : 'part'), type: part.contentType, method: methodOf(part.content.toString('utf8')), text: part.content.toString('utf8'),
    })),
    headers: Object.fromEntries(mail.headerLines.map(({ key, line }) => [key, line.slice(line.indexOf(':') + 1).trim()])),
    raw: raw.toString('utf8'),
  };
}

const methodOf = (content: string) => /^METHOD:(\w+)\s*$/m.exec(content)?.[1] ?? null;

const addresses = (to: AddressObject | AddressObject[] | undefined): string[] =>
  (to === undefined ? [] : [to].flat()).flatMap((group) => group.value.map((one) => one.address ?? ''));
