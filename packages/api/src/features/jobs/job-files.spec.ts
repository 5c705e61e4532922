import { randomBytes } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import sharp from 'sharp';
import type { JobFile, UploadedJobFile } from '@bookmatch/common/jobs/job-files-contract';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('the files of a job', () => {
  let api: TestApi;
  let shop: TestShop;
  let customerId: string;
  let jobId: string;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    const customer = await shop.owner.post('/customers', { kind: 'homeowner', name: 'Mara Teel' });
    customerId = (customer.body as { id: string }).id;
    jobId = await makeJob();
  });
  afterAll(() => api.close());

  const makeJob = async (fields: object = {}) =>
    ((await shop.owner.post('/jobs', { title: 'Pantry', customerId, ...fields })).body as Job).id;
  /** A photo that no other test has. */
  const photo = () =>
    sharp(randomBytes(60 * 40 * 3), { raw: { width: 60, height: 40, channels: 3 } })
      .withExif({ IFD0: { Make: 'Pinhole' } })
      .jpeg()
      .toBuffer();
  const upload = async (content: Buffer | string, name = 'photo.jpg', client = shop.owner, job = jobId) =>
    client.upload(`/jobs/${job}/files`, name, Buffer.from(content));
  const uploaded = async (content: Buffer | string, name = 'photo.jpg') => {
    const answer = await upload(content, name);
    if (answer.status !== 201) throw new Error(answer.text);
    return answer.body as UploadedJobFile;
  };
  const list = async () => ((await shop.owner.get(`/jobs/${jobId}/files`)).body as { rows: JobFile[] }).rows;
  /** The names that lie in the shop's folder of the file store. */
  const kept = () => readdir(join(api.platform.config.filesDir, shop.id)).catch(() => [] as string[]);

  it('keep a photo as it came, with a small picture of it that tells nothing of the camera', async () => {
    const content = await photo();
    const file = await uploaded(content, 'Wall by the window.JPG');
    expect(file).toMatchObject({
      name: 'Wall by the window.JPG',
      mediaType: 'image/jpeg',
      bytes: content.length,
      hasThumbnail: true,
      uploadedBy: 'Owner 1',
      alreadyHere: false,
    });
    const whole = await shop.owner.get(`/jobs/${jobId}/files/${file.id}/content`);
    expect(whole.body).toEqual(content);
    expect(whole.headers).toMatchObject({
      'content-type': 'image/jpeg',
      'content-disposition': "inline; filename*=UTF-8''Wall%20by%20the%20window.JPG",
      'x-content-type-options': 'nosniff',
      'content-security-policy': expect.stringMatching(/^sandbox/),
      'cache-control': 'no-store',
    });
    const small = await shop.owner.get(`/jobs/${jobId}/files/${file.id}/thumbnail`);
    expect(small.headers['content-type']).toBe('image/webp');
    expect((await sharp(small.body as Buffer).metadata()).exif).toBeUndefined();
    expect((await list())[0]?.id).toBe(file.id);
  });

  it('are one file when the same content comes again, also at the same time', async () => {
    const content = await photo();
    const first = await uploaded(content, 'a.jpg');
    expect(await uploaded(content, 'b.jpg')).toMatchObject({
      id: first.id,
      name: 'a.jpg',
      alreadyHere: true,
    });
    const other = await photo();
    const before = (await kept()).length;
    const answers = await Promise.all(Array.from({ length: 6 }, () => upload(other)));
    expect(answers.every(({ status }) => status === 201)).toBe(true);
    expect(new Set(answers.map(({ body }) => (body as JobFile).id)).size).toBe(1);
    expect((await kept()).length).toBe(before + 2);
    const elsewhere = await upload(content, 'a.jpg', shop.owner, await makeJob());
    expect(elsewhere.body).toMatchObject({ alreadyHere: false });
  });

  it('hand out what a browser could run only to be kept', async () => {
    for (const [content, name, type] of [
      ['%PDF-1.7\n%âãÏÓ\n1 0 obj', 'plan.pdf', 'application/pdf'],
      ['Scribe to the left wall\n', 'notes.txt', 'text/plain'],
      ['part,mm\nstile,762\n', 'parts.csv', 'text/csv'],
      ['0\nSECTION\n2\nENTITIES\n', 'island.dxf', 'image/vnd.dxf'],
    ] as const) {
      const { id, hasThumbnail } = await uploaded(content, name);
      expect(hasThumbnail).toBe(false);
      const answer = await shop.owner.get(`/jobs/${jobId}/files/${id}/content`);
      expect(answer.headers['content-type']).toMatch(type);
      expect(answer.headers['content-disposition']).toMatch(/^attachment; /);
      expect(answer.headers['x-content-type-options']).toBe('nosniff');
      expect((await shop.owner.get(`/jobs/${jobId}/files/${id}/thumbnail`)).status).toBe(404);
    }
  });

  it('refuse markup, programs, disguises and damage, and keep nothing of them', async () => {
    const before = (await kept()).length;
    const refusals: [Buffer | string, string, number][] = [
      ['<svg xmlns="http://www.w3.org/2000/svg" onload="alert(1)"/>', 'logo.svg', 415],
      ['<!doctype html><script>alert(1)</script>', 'photo.jpg', 415],
      [Buffer.from('4d5a90000300', 'hex'), 'setup.pdf', 415],
      [Buffer.from('504b03041400000008', 'hex'), 'bomb.zip', 415],
      ['', 'nothing.txt', 415],
      [(await photo()).subarray(0, 300), 'cut.jpg', 422],
    ];
    for (const [content, name, status] of refusals) expect((await upload(content, name)).status).toBe(status);
    expect((await kept()).length).toBe(before);
  });

  it('refuse more than 25 MB, and a request without a file', async () => {
    expect((await upload(Buffer.alloc(25 * 1024 * 1024 + 1, 'a'), 'long.txt')).status).toBe(413);
    expect((await shop.owner.post(`/jobs/${jobId}/files`)).status).toBe(422);
  });

  it('keep names as text: no folders, nothing unseen, and never as a path', async () => {
    const { id, name } = await uploaded(await photo(), '../../etc/pass\u202Egpj.wd');
    expect(name).toBe('passgpj.wd');
    expect(await kept()).toContain(id);
    expect((await uploaded(await photo(), '木'.repeat(80))).name).toHaveLength(80);
    expect((await uploaded(await photo(), '"; drop.jpg')).name).toBe('"; drop.jpg');
  });

  it('are removed with a line in the audit, the bytes once that is committed', async () => {
    const { id } = await uploaded(await photo());
    expect(await kept()).toEqual(expect.arrayContaining([id, `${id}-small`]));
    expect((await shop.owner.delete(`/jobs/${jobId}/files/${id}`)).status).toBe(204);
    expect((await shop.owner.get(`/jobs/${jobId}/files/${id}/content`)).status).toBe(404);
    await api.product.outbox.drain();
    expect((await kept()).filter((name) => name.startsWith(id))).toEqual([]);
    const rows: { action: string }[] = await api.platform.dataSource.query(
      "select action from audit_entry where row_id = ? and table_name = 'job_file' order by id",
      [id],
    );
    expect(rows.map(({ action }) => action)).toEqual(['insert', 'delete']);
  });

  /** Carries out the sweep that an upload asked for, as the outbox does an hour later. */
  const sweepLast = async () => {
    const [message] = await api.platform.dataSource.query<{ id: string; payload: string }[]>(
      "select id, payload from outbox_message where kind = 'job-file-sweep' order by id desc limit 1",
    );
    const sweep = JSON.parse(message!.payload) as { fileId: string };
    const inShop = { id: message!.id, shopId: shop.id };
    await api.product.services.jobFiles.sweep(api.platform.work, api.clock.read(), sweep, inShop);
  };

  it('keep their bytes when the row was written and the answer of the database got lost', async () => {
    const { transaction } = api.platform.work;
    const content = await photo();
    const lost = jest
      .spyOn(api.platform.work, 'transaction')
      .mockImplementationOnce((stamp, work) => api.platform.work.read(stamp, work))
      .mockImplementationOnce(async (stamp, work) => {
        await transaction.call(api.platform.work, stamp, work);
        throw new TypeError('The connection is gone.');
      });
    expect((await upload(content)).status).toBe(500);
    lost.mockRestore();
    const { id, alreadyHere } = await uploaded(content);
    await sweepLast();
    expect(alreadyHere).toBe(true);
    expect((await shop.owner.get(`/jobs/${jobId}/files/${id}/content`)).status).toBe(200);
  });

  it('leave no bytes behind when the row could not be written, nor when the process died before', async () => {
    const before = (await kept()).length;
    const insert = jest
      .spyOn(api.platform.work, 'transaction')
      .mockImplementationOnce((stamp, work) => api.platform.work.read(stamp, work))
      .mockRejectedValueOnce(new TypeError('The database is gone.'));
    expect((await upload(await photo())).status).toBe(500);
    insert.mockRestore();
    await sweepLast();
    expect((await kept()).length).toBe(before);

    const orphan = '01930000-0000-7000-8000-0000000000ff';
    const inShop = { id: '01930000-0000-7000-8000-0000000000fe', shopId: shop.id };
    await api.platform.files.keepBytes(`${shop.id}/${orphan}`, Buffer.from('left'));
    const { jobFiles } = api.product.services;
    await jobFiles.sweep(api.platform.work, api.clock.read(), { fileId: orphan }, inShop);
    const { id } = await uploaded(await photo());
    await jobFiles.sweep(api.platform.work, api.clock.read(), { fileId: id }, inShop);
    expect(await kept()).toContain(id);
    expect(await kept()).not.toContain(orphan);
  });

  it('are added by all roles on jobs they see, removed by all but crew, and not there for strangers', async () => {
    const { client: crew } = await shop.join('crew');
    const added = await upload(await photo(), 'site.jpg', crew);
    expect(added.status).toBe(201);
    const { id } = added.body as JobFile;
    expect((await crew.get(`/jobs/${jobId}/files/${id}/thumbnail`)).status).toBe(200);
    expect((await crew.delete(`/jobs/${jobId}/files/${id}`)).status).toBe(403);
    const hidden = await makeJob({ openToCrew: false });
    expect((await upload(await photo(), 'site.jpg', crew, hidden)).status).toBe(404);
    const moved = await crew.get(`/jobs/${hidden}/files/${id}/content`);
    expect(moved.status).toBe(404);

    const stranger = await api.signUp();
    const theirs = await stranger.owner.post('/customers', { kind: 'homeowner', name: 'X' });
    const body = { title: 'Theirs', customerId: (theirs.body as { id: string }).id };
    const theirJob = ((await stranger.owner.post('/jobs', body)).body as Job).id;
    for (const path of [`/jobs/${jobId}/files/${id}`, `/jobs/${theirJob}/files/${id}`]) {
      expect((await stranger.owner.get(`${path}/content`)).status).toBe(404);
      expect((await stranger.owner.get(`${path}/thumbnail`)).status).toBe(404);
      expect((await stranger.owner.delete(path)).status).toBe(404);
    }
    expect((await upload(await photo(), 'x.jpg', stranger.owner)).status).toBe(404);
    const { client: leadHand } = await shop.join('lead-hand');
    expect((await leadHand.delete(`/jobs/${jobId}/files/${id}`)).status).toBe(204);
  });
});
