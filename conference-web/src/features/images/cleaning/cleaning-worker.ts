import { answerCleaning, type CleaningRequest } from './answer-cleaning.js';

/** The worker's entry: one file after another, so that the page stays free. */
self.onmessage = async ({ data }: MessageEvent<CleaningRequest>) => {
  const answer = await answerCleaning(data);
  self.postMessage(answer, { transfer: 'cleaned' in answer ? [answer.cleaned.bytes.buffer] : [] });
};
