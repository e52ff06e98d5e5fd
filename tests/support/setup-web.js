/** What jsdom lacks and the client asks for at import time. */
if (!window.matchMedia) {
  window.matchMedia = (media) => ({
    media,
    matches: false,
    onchange: null,
    addEventListener() {},
    removeEventListener() {},
    addListener() {},
    removeListener() {},
    dispatchEvent: () => false,
  });
}
if (!window.ResizeObserver) {
  window.ResizeObserver = class {
    observe() {}
    unobserve() {}
    disconnect() {}
  };
}
if (!globalThis.TextEncoder) {
  const { TextDecoder, TextEncoder } = require('node:util');
  Object.assign(globalThis, { TextDecoder, TextEncoder });
}
// jsdom lays nothing out: the page is as large as its window.
Object.defineProperties(document.documentElement, {
  clientWidth: { configurable: true, get: () => window.innerWidth },
  clientHeight: { configurable: true, get: () => window.innerHeight },
});
// The clock of the tests resumes after settled promises with it.
globalThis.setImmediate ??= require('node:timers').setImmediate;
