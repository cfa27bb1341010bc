import { inject, Injectable } from '@angular/core';
import { Session } from '../session/session';
import { DEVICE_DATABASE } from './forget-device';

const shelves = ['drafts', 'photos'] as const;

/** What is kept on the device: answers not sent yet, and photos on their way. */
export type Shelf = (typeof shelves)[number];

interface Kept {
  readonly personId: string;
  readonly savedAt: number;
  readonly value: unknown;
}

/** Unsent work older than this is of no use to anyone and should not lie about. */
const KEPT_FOR = 7 * 86_400_000;

/**
 * Values kept on this device for the person signed in, by key. Nobody else sees them, sign-out
 * erases them, and after a week they are gone. Where the browser refuses to keep anything (private
 * windows), they live as long as the page.
 */
@Injectable({ providedIn: 'root' })
export class DeviceStore {
  private readonly session = inject(Session);
  private readonly memory = new Map<string, Kept>();
  private opened: Promise<IDBDatabase | null> | undefined;

  async get<T>(shelf: Shelf, key: string): Promise<T | undefined> {
    const kept = await this.run<Kept>(shelf, 'readonly', (it) => it.get(this.full(key)));
    return this.mine(kept ?? this.memory.get(`${shelf} ${this.full(key)}`)) as T | undefined;
  }

  async put(shelf: Shelf, key: string, value: unknown): Promise<void> {
    const kept = { personId: this.personId(), savedAt: Date.now(), value } satisfies Kept;
    const done = await this.run(shelf, 'readwrite', (it) => it.put(kept, this.full(key)));
    if (done === null) this.memory.set(`${shelf} ${this.full(key)}`, kept);
  }

  async remove(shelf: Shelf, key: string): Promise<void> {
    this.memory.delete(`${shelf} ${this.full(key)}`);
    await this.run(shelf, 'readwrite', (it) => it.delete(this.full(key)));
  }

  /** Everything of this person on a shelf, oldest first. */
  async all<T>(shelf: Shelf): Promise<T[]> {
    const kept = (await this.run<Kept[]>(shelf, 'readonly', (it) => it.getAll())) ?? [
      ...this.memory.values(),
    ];
    return kept
      .filter((it) => this.mine(it) !== undefined)
      .sort((a, b) => a.savedAt - b.savedAt)
      .map(({ value }) => value as T);
  }

  private personId(): string {
    return this.session.person()?.id ?? '';
  }

  private full(key: string): string {
    return `${this.personId()}/${key}`;
  }

  private mine(kept: Kept | undefined): unknown {
    const fresh = kept && kept.personId === this.personId() && kept.savedAt > Date.now() - KEPT_FOR;
    return fresh ? kept.value : undefined;
  }

  /** One request; null when the device keeps nothing. */
  private async run<T>(
    shelf: Shelf,
    mode: IDBTransactionMode,
    ask: (store: IDBObjectStore) => IDBRequest,
  ): Promise<T | null> {
    const database = await (this.opened ??= this.open());
    if (!database) return null;
    return new Promise((resolve) => {
      try {
        const transaction = database.transaction(shelf, mode);
        const request = ask(transaction.objectStore(shelf));
        transaction.oncomplete = () => resolve(request.result as T);
        transaction.onabort = () => resolve(null);
      } catch {
        // Erased by a sign-out in another window; the next call opens it anew.
        this.opened = undefined;
        resolve(null);
      }
    });
  }

  private open(): Promise<IDBDatabase | null> {
    return new Promise((resolve) => {
      if (typeof indexedDB === 'undefined') return resolve(null);
      const request = indexedDB.open(DEVICE_DATABASE, 1);
      request.onupgradeneeded = () => {
        for (const shelf of shelves) request.result.createObjectStore(shelf);
      };
      request.onerror = () => resolve(null);
      request.onsuccess = () => {
        const database = request.result;
        database.onversionchange = () => {
          database.close();
          this.opened = undefined;
        };
        this.sweep(database);
        resolve(database);
      };
    });
  }

  /** Removes what is too old, whosever it was. */
  private sweep(database: IDBDatabase): void {
    for (const shelf of shelves) {
      const request = database.transaction(shelf, 'readwrite').objectStore(shelf).openCursor();
      request.onsuccess = () => {
        const cursor = request.result;
        if (!cursor) return;
        if ((cursor.value as Kept).savedAt < Date.now() - KEPT_FOR) cursor.delete();
        cursor.continue();
      };
    }
  }
}
