/** @jest-environment node */
import { Worker } from 'node:worker_threads';
import { answerCleaning, type CleaningAnswer, type CleaningRequest } from './answer-cleaning.js';
import { CleaningClient, type CleaningWorker } from './cleaning-client.js';
import { dicomSample } from './testing/dicom-samples.js';

const confirmed = { pixelsConfirmed: true };
const film = () => new Blob([dicomSample('test_files/CT_small.dcm')]);

/** What the worker does, over a real channel; threads of this runner can't load the TypeScript of one. */
function nearWorker(): CleaningWorker {
  const { port1, port2 } = new MessageChannel();
  port2.onmessage = ({ data }: MessageEvent<CleaningRequest>) => void answerCleaning(data).then((answer) => port2.postMessage(answer));
  const worker: CleaningWorker = {
    postMessage: (request) => port1.postMessage(request),
    onmessage: null,
    onerror: null,
    terminate: () => port1.close(),
  };
  port1.onmessage = (event: MessageEvent<CleaningAnswer>) => worker.onmessage?.(event);
  return worker;
}

/** A thread that never comes to an end by itself. */
function endlessWorker(ended: () => void): CleaningWorker {
  const thread = new Worker('require("node:worker_threads").parentPort.on("message", () => { for (;;); })', { eval: true });
  return { postMessage: () => thread.postMessage('go'), onmessage: null, onerror: null, terminate: () => void thread.terminate().then(ended) };
}

it('cleans the files of one upload with the same new UIDs', async () => {
  const client = new CleaningClient(nearWorker);
  const [first, second] = await Promise.all([client.clean(film(), confirmed), client.clean(film(), confirmed)]);
  client.close();
  expect(Buffer.from(first.bytes).equals(Buffer.from(second.bytes))).toBe(true);
});

it('goes on with the rest after a file that is refused', async () => {
  const client = new CleaningClient(nearWorker);
  const answers = await Promise.allSettled([
    client.clean(new Blob(['%PDF-1.7\n']), confirmed),
    client.clean(new Blob([]), confirmed),
    client.clean(film(), confirmed),
  ]);
  client.close();
  expect(answers.map(({ status }) => status)).toEqual(['rejected', 'rejected', 'fulfilled']);
});

it('ends a worker that takes too long, and goes on with another', async () => {
  let ended: () => void = () => undefined;
  const end = new Promise<void>((resolve) => (ended = resolve));
  const workers = [() => endlessWorker(ended), nearWorker];
  const client = new CleaningClient(() => workers.shift()!(), 1500);
  await expect(client.clean(film(), confirmed)).rejects.toThrow(/took too long/);
  await end;
  await expect(client.clean(film(), confirmed)).resolves.toMatchObject({ kind: 'dicom' });
  client.close();
});

it('refuses a file of 300 MB without reading it', async () => {
  const client = new CleaningClient(() => {
    throw new Error('no worker is needed');
  });
  const large = new Blob(Array.from({ length: 300 }, () => new Uint8Array(1024 * 1024)));
  await expect(client.clean(large, confirmed)).rejects.toThrow(/larger than 256 MB/);
});
