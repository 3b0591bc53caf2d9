import { randomUUID } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { type ParsedMail, simpleParser } from "mailparser";

export interface CaughtMail {
  readonly id: string;
  readonly receivedAt: Date;
  /** Whom the sending program named to the server, which may differ from the To line. */
  readonly envelopeTo: readonly string[];
  /** The bytes as they came, one character for each. */
  readonly raw: string;
  readonly parsed: ParsedMail;
}

const parse = (raw: string): Promise<ParsedMail> => simpleParser(Buffer.from(raw, "latin1"));

/** Mails caught on this machine, newest first. Kept as files where a folder is given, so that they outlive a restart. */
export class MailStore {
  private mails: CaughtMail[] = [];

  constructor(
    private readonly folder: string | null,
    private readonly limit = 300,
  ) {}

  async load(): Promise<void> {
    if (this.folder === null || !existsSync(this.folder)) return;
    const names = readdirSync(this.folder).filter((name) => name.endsWith(".json"));
    for (const name of names.sort().slice(-this.limit)) {
      const kept = JSON.parse(readFileSync(join(this.folder, name), "utf8")) as StoredMail;
      const parsed = await parse(kept.raw);
      this.mails.unshift({ ...kept, receivedAt: new Date(kept.receivedAt), parsed });
    }
  }

  async add(raw: string, envelopeTo: readonly string[], receivedAt: Date): Promise<CaughtMail> {
    const mail = { id: randomUUID(), receivedAt, envelopeTo, raw, parsed: await parse(raw) };
    this.mails.unshift(mail);
    this.mails.length = Math.min(this.mails.length, this.limit);
    if (this.folder !== null) {
      mkdirSync(this.folder, { recursive: true, mode: 0o700 });
      const { parsed: _, ...kept } = mail;
      const name = `${receivedAt.toISOString().replaceAll(":", "-")}-${mail.id}.json`;
      writeFileSync(join(this.folder, name), JSON.stringify(kept), { mode: 0o600 });
    }
    return mail;
  }

  /** @param to only mails to this address, in any case */
  list(to: string | null): readonly CaughtMail[] {
    if (to === null || to === "") return this.mails;
    const wanted = to.toLowerCase();
    return this.mails.filter((mail) => mail.envelopeTo.some((address) => address.toLowerCase() === wanted));
  }

  find(id: string): CaughtMail | null {
    return this.mails.find((mail) => mail.id === id) ?? null;
  }

  clear(): void {
    this.mails = [];
    if (this.folder !== null) rmSync(this.folder, { recursive: true, force: true });
  }
}

interface StoredMail {
  readonly id: string;
  readonly receivedAt: string;
  readonly envelopeTo: readonly string[];
  readonly raw: string;
}
