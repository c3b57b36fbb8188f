import { deviceWords } from './device-words';

// The forms of the header: MDN Web Docs, "User-Agent header" (examples for Firefox, Chrome, Edge, Safari).
it.each([
  ['Mozilla/5.0 (X11; Linux x86_64; rv:42.0) Gecko/20100101 Firefox/42.0', 'Firefox on Linux'],
  ['Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/51.0.2704.103 Safari/537.36', 'Chrome on Linux'],
  ['Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/91.0.4472.124 Safari/537.36 Edg/91.0.864.59', 'Edge on Windows'],
  ['Mozilla/5.0 (iPhone; CPU iPhone OS 13_5_1 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/13.1.1 Mobile/15E148 Safari/604.1', 'Safari on iPhone'],
  ['curl/7.64.1', 'curl/7.64.1'],
  ['', 'Unknown device'],
])('reads %s', (userAgent, words) => {
  expect(deviceWords(userAgent)).toBe(words);
});
