import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type S3rver from '@20minutes/s3rver';
import sharp from 'sharp';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork, procedureContent } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';
import { freePort } from '@test/support/free-port';
import { s3Fake } from '../../deploy/local/s3-fake';

describe('photos', () => {
  let app: TestApp;
  let store: S3rver;
  let folder: string;
  let fleet: Fleet;
  let technician: Browser;

  beforeAll(async () => {
    const port = await freePort();
    folder = mkdtempSync(join(tmpdir(), 'vatwright-photos-'));
    store = s3Fake(port, folder);
    await store.run();
    process.env['VATWRIGHT_TEST_S3'] = `http://127.0.0.1:${port}`;
    app = await testApp();
    delete process.env['VATWRIGHT_TEST_S3'];
    fleet = await makeFleet(app.db);
    technician = await signIn('technician');
  });
  afterAll(async () => {
    await app.close();
    await store.close();
    rmSync(folder, { recursive: true });
  });

  async function signIn(role: 'technician' | 'account-owner' | 'store-manager', of = fleet) {
    const scope = { kind: 'store', id: of.storeId } as const;
    const person = await makePerson(app.db, of.organisationId, role, scope);
    return app.browser().signIn(person.email);
  }
  const canvas = (width: number, height: number) =>
    sharp({ create: { width, height, channels: 3, background: '#e2932a' } });
  const send = (photo: Buffer, more: { by?: Browser; storeId?: string; id?: string } = {}) =>
    (more.by ?? technician)
      .put(`/stores/${more.storeId ?? fleet.storeId}/photos/${more.id ?? randomUUID()}`)
      .attach('photo', photo, { filename: '../../etc/photo.jpg', contentType: 'image/jpeg' });
  const bodyOf = async (path: string, by = technician) => {
    const { body } = await by.get(path).buffer(true).expect(200);
    return body as Buffer;
  };

  it('are kept upright and small, without place, device or anything hidden behind them', async () => {
    const secret = 'alert("hidden")';
    const sent = await canvas(3000, 1500)
      .withExif({
        IFD0: { Make: 'Camera maker' },
        IFD3: { GPSLatitude: '41/1 52/1 0/1', GPSLatitudeRef: 'N' },
      })
      // Orientation 6: to be turned by 90° to stand upright.
      .withMetadata({ orientation: 6 })
      .jpeg()
      .toBuffer();
    const { body } = await send(Buffer.concat([sent, Buffer.from(secret)])).expect(200);
    expect(body).toMatchObject({ width: 1024, height: 2048 });
    const kept = await bodyOf(`/photos/${body.id}`);
    const metadata = await sharp(kept).metadata();
    expect(metadata).toMatchObject({ format: 'jpeg', width: 1024, height: 2048 });
    expect(metadata.exif).toBeUndefined();
    expect(metadata.orientation).toBeUndefined();
    expect(kept.includes(secret)).toBe(false);
    const small = await sharp(await bodyOf(`/photos/${body.id}/thumbnail`)).metadata();
    expect(small).toMatchObject({ format: 'jpeg', width: 160, height: 320 });
  });

  it('are served as an image and nothing else, to our own pages only', async () => {
    const { body } = await send(await canvas(40, 30).png().toBuffer()).expect(200);
    const reply = await technician.get(`/photos/${body.id}`).expect(200);
    expect(reply.headers).toMatchObject({
      'content-type': 'image/jpeg',
      'x-content-type-options': 'nosniff',
      'content-security-policy': "default-src 'none'; sandbox",
      'content-disposition': `inline; filename="photo-${body.id}.jpg"`,
      'cache-control': 'private, no-cache',
      'cross-origin-resource-policy': 'same-origin',
    });
    await technician.get(`/photos/${body.id}`).set('Sec-Fetch-Site', 'cross-site').expect(403);
    await technician
      .get(`/photos/${body.id}`)
      .set('If-None-Match', reply.headers['etag'] as string)
      .expect(304);
  });

  const notPhotos: [string, Buffer, string][] = [
    ['SVG', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'), 'photo-type'],
    ['HTML', Buffer.from('<!doctype html><script>1</script>'), 'photo-type'],
    ['GIF', Buffer.from('GIF89a;'), 'photo-type'],
    ['HEIC', Buffer.from('\x00\x00\x00\x18ftypheic0000', 'latin1'), 'photo-heic'],
    [
      'a script that begins like a JPEG',
      Buffer.from('\xff\xd8\xff/*js*/', 'latin1'),
      'photo-damaged',
    ],
  ];
  it.each(notPhotos)('refuse %s, whatever it is called', async (_, bytes, code) => {
    const { body } = await send(bytes).expect(422);
    expect(body.code).toBe(code);
  });

  it('refuse half a photo', async () => {
    const whole = await canvas(400, 400).jpeg().toBuffer();
    const { body } = await send(whole.subarray(0, whole.length / 2)).expect(422);
    expect(body.code).toBe('photo-damaged');
  });

  it('refuse a small file that unfolds into too many pixels', async () => {
    const bomb = await canvas(9000, 9000).png({ compressionLevel: 9 }).toBuffer();
    const { body } = await send(bomb).expect(422);
    expect(body.code).toBe('photo-pixels');
  });

  it('refuse a file over the limit and a request without a photo', async () => {
    await send(Buffer.alloc(15_000_001)).expect(413);
    const { body } = await technician
      .put(`/stores/${fleet.storeId}/photos/${randomUUID()}`)
      .expect(422);
    expect(body.errors[0]).toMatchObject({ field: 'photo', reason: 'required' });
  });

  it('sent twice under one id are one, and never replace another’s', async () => {
    const photo = await canvas(40, 30).jpeg().toBuffer();
    const { body } = await send(photo).expect(200);
    await send(photo, { id: body.id }).expect(200);
    const manager = await signIn('store-manager');
    await send(photo, { id: body.id, by: manager }).expect(409);
  });

  it('are for those who see the store, in no other store and no other organisation', async () => {
    const photo = await canvas(40, 30).jpeg().toBuffer();
    const { body } = await send(photo).expect(200);
    const owner = await signIn('account-owner');
    await owner.get(`/photos/${body.id}`).expect(200);
    await send(photo, { by: owner }).expect(403);
    const neighbour = await makeFleet(app.db, {
      organisationId: fleet.organisationId,
      chainId: fleet.chainId,
    });
    const elsewhere = await signIn('store-manager', neighbour);
    await elsewhere.get(`/photos/${body.id}`).expect(404);
    await elsewhere.get(`/photos/${body.id}/thumbnail`).expect(404);
    await send(photo, { by: elsewhere }).expect(403);
    const stranger = await signIn('technician', await makeFleet(app.db));
    await stranger.get(`/photos/${body.id}`).expect(404);
    await send(photo, { by: stranger }).expect(404);
    await app.browser().get(`/photos/${body.id}`).expect(401);
  });

  it('belong to a reported finding of their own store', async () => {
    const report = (photoId: string) =>
      technician.post('/findings', {
        id: randomUUID(),
        storeId: fleet.storeId,
        unitId: fleet.unitId,
        componentKind: 'pump',
        cause: 'worn-seal',
        severity: 'plan',
        note: 'Drips at the slot',
        photoIds: [photoId],
      });
    const { body } = await report(randomUUID()).expect(422);
    expect(body.errors).toMatchObject([{ field: 'photoIds.0', reason: 'unknown-photo' }]);
    const own = await send(await canvas(40, 30).jpeg().toBuffer()).expect(200);
    const found = await report(own.body.id).expect(200);
    expect(found.body.photoIds).toEqual([own.body.id]);
  });

  it('belong to the steps of a task in their own store', async () => {
    app.setNow('2026-06-10T15:00:00Z');
    const work = await makeWork(app.db, fleet);
    const taskId = await work.makeTask();
    const procedure = await app.db.owner.query(
      `SELECT procedure_id AS id FROM procedure_versions WHERE id = '${work.procedureVersionId}'`,
    );
    const procedureVersionId = await insert(app.db, 'procedure_versions', {
      organisation_id: fleet.organisationId,
      procedure_id: (procedure[0] as { id: string }[])[0]?.id,
      number: 2,
      published_at: '2026-02-01T00:00:00Z',
      content: {
        ...procedureContent,
        steps: [{ key: 'view', kind: 'photo', text: { en: 'Seal', es: 'Sello' }, required: true }],
      },
    });
    const close = (photoId: string) =>
      technician.put(`/tasks/${taskId}/inspection`, {
        id: randomUUID(),
        procedureVersionId,
        startedAt: null,
        note: '',
        readings: [{ step: 'view', kind: 'photo', photoIds: [photoId] }],
      });
    const neighbour = await makeFleet(app.db, { organisationId: fleet.organisationId });
    const away = await signIn('technician', neighbour);
    const photo = await canvas(40, 30).jpeg().toBuffer();
    const theirs = await send(photo, { by: away, storeId: neighbour.storeId }).expect(200);
    for (const id of [randomUUID(), theirs.body.id as string]) {
      const { body } = await close(id).expect(422);
      expect(body.errors).toMatchObject([{ field: 'readings.view', reason: 'unknown-photo' }]);
    }
    const own = await send(photo).expect(200);
    await close(own.body.id).expect(200);
    const { body } = await technician.get(`/tasks/${taskId}/sheet`).expect(200);
    expect(JSON.stringify(body.inspection.readings)).toContain(own.body.id);
  });
});

describe('a photo store out of reach', () => {
  it('says so and keeps no row', async () => {
    const app = await testApp();
    const fleet = await makeFleet(app.db);
    const person = await makePerson(app.db, fleet.organisationId, 'technician');
    const technician = await app.browser().signIn(person.email);
    const photo = await sharp({ create: { width: 9, height: 9, channels: 3, background: 'red' } })
      .jpeg()
      .toBuffer();
    await technician
      .put(`/stores/${fleet.storeId}/photos/${randomUUID()}`)
      .attach('photo', photo, 'photo.jpg')
      .expect(503);
    const [rows] = await app.db.owner.query('SELECT id FROM uploads');
    expect(rows).toEqual([]);
    await app.close();
  });
});
