import { createHash } from 'node:crypto';
import { dicomPicture, dicomSamples } from '../../test/support/dicom-files.js';
import { DicomRenderer } from './dicom-renderer.service.js';

const picture = (rows: number) => dicomPicture({ rows, columns: 64, pixels: Array.from({ length: rows * 64 }, (_, index) => index % 4096) });

describe('the DICOM decoder beside the server', () => {
  let renderer: DicomRenderer;

  beforeEach(() => {
    renderer = new DicomRenderer();
  });

  afterEach(() => renderer.onApplicationShutdown());

  it('is ended when a file takes too long, and the next file is read by a new one', async () => {
    renderer.timeLimitMs = 0;
    await expect(renderer.render(picture(64))).rejects.toMatchObject({ code: 'invalid', detail: expect.stringContaining('too long') });
    renderer.timeLimitMs = 30_000;
    expect(await renderer.render(picture(64))).toMatchObject({ width: 64, height: 64, channels: 1 });
  });

  it('answers each file with its own picture where several come at once, a broken one among them', async () => {
    const broken = Buffer.from(dicomSamples().get('MR_small_jpeg_ls_lossless.dcm')!);
    // inside the coded picture
    broken.fill(0x55, broken.length - 3000, broken.length - 1000);
    const hash = (data: Buffer) => createHash('sha256').update(data).digest('hex');
    const alone = hash((await renderer.render(picture(32))).data);
    const answers = await Promise.allSettled([picture(32), broken, picture(48), picture(32)].map((file) => renderer.render(file)));
    expect(answers.map(({ status }) => status)).toEqual(['fulfilled', 'rejected', 'fulfilled', 'fulfilled']);
    const done = answers.flatMap((answer) => (answer.status === 'fulfilled' ? [answer.value] : []));
    expect(done.map(({ height }) => height)).toEqual([32, 48, 32]);
    expect([done[0]!, done[2]!].map(({ data }) => hash(data))).toEqual([alone, alone]);
  });

  it('leaves the bytes it was given as they were', async () => {
    const file = picture(64);
    const before = Buffer.from(file);
    await renderer.render(file);
    expect(file.equals(before)).toBe(true);
  });
});
