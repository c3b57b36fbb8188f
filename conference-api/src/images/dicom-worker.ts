/**
 * What runs beside the server to decode DICOM: plain CommonJS text, so that it needs no build of its own.
 * It takes one file after another, and answers each with grey or RGB bytes, or with a refusal.
 */
export const DICOM_WORKER = `
const { parentPort, workerData } = require('node:worker_threads');
const load = require('node:module').createRequire(workerData.base);
const dcmjs = load('dcmjs');
dcmjs.log?.disableAll?.();
for (const name of ['log', 'info', 'warn', 'error', 'debug']) console[name] = () => {};
const { DicomImage, NativePixelDecoder } = load('dcmjs-imaging');
const ready = NativePixelDecoder.initializeAsync();

// the same spacing down and across, in mm; pixels that are not square have no one scale
const spacingOf = (image) => {
  const spacing = image.getElement('PixelSpacing') ?? image.getElement('ImagerPixelSpacing');
  const list = Array.isArray(spacing) ? spacing.map(Number) : typeof spacing === 'string' ? spacing.split('\\\\').map(Number) : [];
  const square = list.length === 2 && list.every((n) => Number.isFinite(n) && n > 0) && Math.abs(list[0] - list[1]) <= list[0] * 1e-3;
  return square ? list[0] : null;
};

const isGrey = (rgba) => {
  for (let i = 0; i < rgba.length; i += 4) if (rgba[i] !== rgba[i + 1] || rgba[i] !== rgba[i + 2]) return false;
  return true;
};

const withoutAlpha = (rgba, channels) => {
  const pixels = new Uint8Array((rgba.length / 4) * channels);
  for (let from = 0, to = 0; from < rgba.length; from += 4) for (let channel = 0; channel < channels; channel++) pixels[to++] = rgba[from + channel];
  return pixels;
};

const render = (file) => {
  const image = new DicomImage(file);
  const width = image.getWidth(), height = image.getHeight();
  if (!(width > 0 && height > 0)) return { refusal: 'no-picture' };
  if (width * height > workerData.mostPixels) return { refusal: 'too-large' };
  const result = image.render({ renderOverlays: false });
  const rgba = new Uint8Array(result.pixels);
  if (rgba.length !== result.width * result.height * 4) return { refusal: 'broken' };
  const channels = isGrey(rgba) ? 1 : 3;
  return { width: result.width, height: result.height, channels, pixels: withoutAlpha(rgba, channels), pixelSpacingMm: spacingOf(image) };
};

parentPort.on('message', async (file) => {
  let answer;
  try {
    await ready;
    answer = render(file);
  } catch {
    answer = { refusal: 'broken' };
  }
  parentPort.postMessage(answer, answer.pixels ? [answer.pixels.buffer] : []);
});
`;
