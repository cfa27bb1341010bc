import { computed, inject, Injectable, signal } from '@angular/core';
import type { addPhoto } from '@shared/uploads/uploads-contract';
import { firstValueFrom } from 'rxjs';
import { Api } from '../api/api';
import { newId } from '../api/new-id';
import { DeviceStore } from '../offline/device-store';
import type { Problem } from '../problems/problem';
import { toProblem } from '../problems/problem';
import { shrinkPhoto } from './shrink-photo';

interface WaitingPhoto {
  readonly id: string;
  readonly storeId: string;
  readonly blob: Blob;
}

/** Why a photo did not go through; kept until it is sent again or taken out. */
export interface Refusal {
  readonly id: string;
  readonly problem: Problem;
}

/**
 * Photos on their way to the server. Each lies on the device until the server has it, so that no
 * dead spot loses one; they are sent again when the network comes back.
 */
@Injectable({ providedIn: 'root' })
export class PhotoOutbox {
  private readonly api = inject(Api);
  private readonly device = inject(DeviceStore);
  private readonly photos = signal<readonly WaitingPhoto[]>([]);
  private readonly failures = signal<readonly Refusal[]>([]);
  private readonly addresses = new Map<string, string>();
  private sending: Promise<void> | undefined;

  /** How many are not sent yet. */
  readonly waiting = computed(() => this.photos().length);
  readonly refusals = this.failures.asReadonly();

  constructor() {
    window.addEventListener('online', () => void this.sendAll());
    void this.device.all<WaitingPhoto>('photos').then((kept) => {
      if (kept.length === 0) return;
      this.photos.update((now) => [...kept, ...now]);
      void this.sendAll();
    });
  }

  /** Takes a photo in and begins to send it. Gives back its id at once. */
  async add(file: Blob, storeId: string): Promise<string> {
    const photo = { id: newId(), storeId, blob: await shrinkPhoto(file) };
    this.photos.update((all) => [...all, photo]);
    await this.device.put('photos', photo.id, photo);
    void this.sendAll();
    return photo.id;
  }

  isWaiting(id: string): boolean {
    return this.photos().some((photo) => photo.id === id);
  }

  /** An address under which this device shows a photo that is not sent yet. */
  localAddress(id: string): string | null {
    const photo = this.photos().find((it) => it.id === id);
    if (!photo) return null;
    const known = this.addresses.get(id) ?? URL.createObjectURL(photo.blob);
    this.addresses.set(id, known);
    return known;
  }

  /** Gives up a photo that was not sent. */
  async drop(id: string): Promise<void> {
    this.photos.update((all) => all.filter((photo) => photo.id !== id));
    this.failures.update((all) => all.filter((it) => it.id !== id));
    const address = this.addresses.get(id);
    if (address) URL.revokeObjectURL(address);
    this.addresses.delete(id);
    await this.device.remove('photos', id);
  }

  /** Sends what waits, one after the other; ends at the first that finds no network. */
  sendAll(): Promise<void> {
    this.sending ??= this.sendInTurn().finally(() => (this.sending = undefined));
    return this.sending;
  }

  private async sendInTurn(): Promise<void> {
    const tried = new Set<string>();
    for (;;) {
      const next = this.photos().find(({ id }) => !tried.has(id));
      if (!next) return;
      tried.add(next.id);
      const problem = await this.send(next);
      if (!problem) {
        await this.drop(next.id);
        continue;
      }
      this.failures.update((all) => [
        ...all.filter(({ id }) => id !== next.id),
        { id: next.id, problem },
      ]);
      if (problem.status === 0) return;
    }
  }

  private async send({ id, storeId, blob }: WaitingPhoto): Promise<Problem | null> {
    const body = new FormData();
    body.append('photo', blob, 'photo.jpg');
    try {
      await firstValueFrom(
        this.api.call<typeof addPhoto>('PUT', '/stores/:storeId/photos/:id', {
          params: { storeId, id },
          body,
        }),
      );
      return null;
    } catch (failure) {
      return toProblem(failure);
    }
  }
}
