import { randomUUID } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { type AddressObject, simpleParser } from 'mailparser';

export interface MessageSummary {
  readonly id: string;
  /** ISO instant at which the message was taken in. */
  readonly receivedAt: string;
  readonly from: string;
  readonly to: readonly string[];
  readonly subject: string;
}

export interface Message extends MessageSummary {
  readonly messageId: string;
  readonly text: string;
  readonly html: string;
  readonly headers: readonly { readonly name: string; readonly value: string }[];
}

const kept = 1000;

/** Messages taken in by the local SMTP server: one `.json` and one `.eml` each, the newest 1,000. */
export class MailStore {
  private summaries: MessageSummary[] = [];

  constructor(private readonly folder: string) {
    mkdirSync(folder, { recursive: true });
    for (const name of readdirSync(folder).sort()) {
      if (name.endsWith('.json')) this.remember(name.slice(0, -'.json'.length));
    }
  }

  /** Newest first. `to` matches a whole address, `search` any part of addresses and subject. */
  list({ to, search }: { to?: string; search?: string } = {}): MessageSummary[] {
    const address = to?.toLowerCase();
    const part = search?.toLowerCase() ?? '';
    return this.summaries
      .filter((it) => !address || it.to.some((one) => one.toLowerCase() === address))
      .filter((it) => [...it.to, it.from, it.subject].join('\n').toLowerCase().includes(part))
      .reverse();
  }

  message(id: string): Message | undefined {
    const known = this.summaries.some((it) => it.id === id);
    return known ? (JSON.parse(readFileSync(this.file(id, 'json'), 'utf8')) as Message) : undefined;
  }

  source(id: string): Buffer | undefined {
    const known = this.summaries.some((it) => it.id === id);
    return known ? readFileSync(this.file(id, 'eml')) : undefined;
  }

  /** Takes in one message as it came over the wire, for the recipients of its envelope. */
  async add(source: Buffer, envelope: { from: string; to: readonly string[] }): Promise<void> {
    const parsed = await simpleParser(source);
    const receivedAt = new Date().toISOString();
    const message: Message = {
      id: `${receivedAt.replaceAll(/[-:.]/g, '')}-${randomUUID().slice(0, 8)}`,
      receivedAt,
      from: addressText(parsed.from) || envelope.from,
      to: envelope.to,
      subject: parsed.subject ?? '',
      messageId: parsed.messageId ?? '',
      text: parsed.text ?? '',
      html: parsed.html || '',
      headers: parsed.headerLines.map(({ key, line }) => ({
        name: line.slice(0, key.length),
        value: line.slice(key.length + 1).trim(),
      })),
    };
    writeFileSync(this.file(message.id, 'eml'), source);
    writeFileSync(this.file(message.id, 'json'), JSON.stringify(message));
    this.summaries.push(summary(message));
    while (this.summaries.length > kept) this.forget(this.summaries[0]?.id ?? '');
  }

  clear(): void {
    for (const { id } of [...this.summaries]) this.forget(id);
  }

  private remember(id: string): void {
    try {
      const message = JSON.parse(readFileSync(this.file(id, 'json'), 'utf8')) as Message;
      this.summaries.push(summary(message));
    } catch {
      // Cut off by a full disk or a kill while it was written: nothing in it can be shown.
      rmSync(this.file(id, 'json'), { force: true });
    }
  }

  private forget(id: string): void {
    this.summaries = this.summaries.filter((it) => it.id !== id);
    rmSync(this.file(id, 'json'), { force: true });
    rmSync(this.file(id, 'eml'), { force: true });
  }

  private file(id: string, ending: 'eml' | 'json'): string {
    return join(this.folder, `${id}.${ending}`);
  }
}

function summary({ id, receivedAt, from, to, subject }: Message): MessageSummary {
  return { id, receivedAt, from, to, subject };
}

function addressText(addresses: AddressObject | AddressObject[] | undefined): string {
  return [addresses ?? []]
    .flat()
    .map(({ text }) => text)
    .join(', ');
}
