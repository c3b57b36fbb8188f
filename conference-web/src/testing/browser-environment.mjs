import { TestEnvironment } from 'jest-environment-jsdom';

// jsdom has no fetch, streams or text coding of its own: Node's are given to the page instead.
const FROM_NODE = [
  ...['fetch', 'Request', 'Response', 'Headers', 'FormData', 'Blob', 'AbortController', 'AbortSignal', 'ReadableStream', 'WritableStream'],
  ...['TransformStream', 'TextEncoder', 'TextDecoder', 'structuredClone', 'BroadcastChannel'],
];

export default class BrowserEnvironment extends TestEnvironment {
  constructor(config, context) {
    super(config, context);
    for (const name of FROM_NODE) this.global[name] = globalThis[name];
    /** Puts the page at another origin: that of a test's server. */
    this.global.openPageAt = (url) => this.dom.reconfigure({ url });
  }
}
