import { mkdir, readdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';

export interface Envelope {
  from: string;
  to: string[];
}

export interface CaughtMail {
  /** Number in order of arrival, from 1. */
  n: number;
  /** Sender and receivers as SMTP said them, not as the headers say. */
  envelope: Envelope;
  from: string;
  to: string[];
  subject: string;
  messageId: string | null;
  /** The mail's own Date header, as an ISO instant. */
  date: string | null;
  /** Header lines by lower-case name, as they came but unfolded. */
  headers: Record<string, string>;
  text: string;
  html: string | null;
  attachments: { filename: string | null; contentType: string; sizeBytes: number }[];
  /** The whole mail as it came over the socket. */
  source: string;
}

export interface MailFilter {
  /** Part of a receiver's address. */
  to?: string;
  /** Part of the subject. */
  subject?: string;
}

interface StoredFile {
  n: number;
  envelope: Envelope;
  sourceBase64: string;
}

const holds = (text: string, part: string | undefined): boolean =>
  part === undefined || text.toLowerCase().includes(part.toLowerCase());

async function parse(n: number, envelope: Envelope, raw: Buffer): Promise<CaughtMail> {
  const mail = await simpleParser(raw, { skipHtmlToText: true, skipTextToHtml: true });
  const headers: Record<string, string> = {};
  for (const { key, line } of mail.headerLines) {
    headers[key] = line
      .slice(line.indexOf(':') + 1)
      .replace(/\r?\n\s+/g, ' ')
      .trim();
  }
  return {
    n,
    envelope,
    from: mail.from?.text ?? envelope.from,
    to: envelope.to,
    subject: mail.subject ?? '',
    messageId: mail.messageId ?? null,
    date: mail.date?.toISOString() ?? null,
    headers,
    text: mail.text ?? '',
    html: mail.html === false ? null : (mail.html ?? null),
    attachments: mail.attachments.map((part) => ({
      filename: part.filename ?? null,
      contentType: part.contentType,
      sizeBytes: part.size,
    })),
    source: raw.toString('utf8'),
  };
}

/** Keeps mails in memory and, when given a folder, one file each, so that they outlive the process. */
export class MailStore {
  private readonly mails: CaughtMail[] = [];
  private nextNumber = 1;

  private constructor(private readonly dir: string | null) {}

  static async open(dir: string | null): Promise<MailStore> {
    const store = new MailStore(dir);
    if (dir) await store.load(dir);
    return store;
  }

  /** Resolves once the mail is on disk: only then may the sender be told that it is accepted. */
  async add(envelope: Envelope, raw: Buffer): Promise<CaughtMail> {
    const n = this.nextNumber++;
    const mail = await parse(n, envelope, raw);
    if (this.dir) {
      const file: StoredFile = { n, envelope, sourceBase64: raw.toString('base64') };
      const path = join(this.dir, `${String(n).padStart(6, '0')}.json`);
      await writeFile(`${path}.part`, JSON.stringify(file), { mode: 0o600 });
      await rename(`${path}.part`, path);
    }
    this.mails.push(mail);
    this.mails.sort((a, b) => a.n - b.n);
    return mail;
  }

  /** Oldest first. */
  list(filter: MailFilter = {}): CaughtMail[] {
    return this.mails.filter(
      (mail) => holds(mail.to.join(' '), filter.to) && holds(mail.subject, filter.subject),
    );
  }

  get(n: number): CaughtMail | undefined {
    return this.mails.find((mail) => mail.n === n);
  }

  async clear(): Promise<void> {
    this.mails.length = 0;
    if (!this.dir) return;
    for (const name of await storedNames(this.dir)) await rm(join(this.dir, name), { force: true });
  }

  private async load(dir: string): Promise<void> {
    await mkdir(dir, { recursive: true, mode: 0o700 });
    for (const name of await storedNames(dir)) {
      const file = JSON.parse(await readFile(join(dir, name), 'utf8')) as StoredFile;
      this.mails.push(await parse(file.n, file.envelope, Buffer.from(file.sourceBase64, 'base64')));
      this.nextNumber = Math.max(this.nextNumber, file.n + 1);
    }
  }
}

async function storedNames(dir: string): Promise<string[]> {
  return (await readdir(dir)).filter((name) => /^\d{6,}\.json$/.test(name)).sort();
}
