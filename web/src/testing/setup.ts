import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterAll, afterEach, beforeAll, expect, vi } from 'vitest';
import { server, undeclared } from './server';

configure({ asyncUtilTimeout: 15_000 });

vi.stubGlobal(
  'ResizeObserver',
  class {
    observe() {}
    unobserve() {}
    disconnect() {}
  },
);
window.matchMedia = (query: string) => ({
  matches: false,
  media: query,
  onchange: null,
  addListener: () => {},
  removeListener: () => {},
  addEventListener: () => {},
  removeEventListener: () => {},
  dispatchEvent: () => false,
});
Object.defineProperty(document, 'fonts', { value: new EventTarget() });
Element.prototype.scrollIntoView = () => {};
window.scrollTo = () => {};

beforeAll(() => server.listen({ onUnhandledRequest: (request) => undeclared.record(request) }));
afterEach(() => {
  cleanup();
  server.resetHandlers();
  localStorage.clear();
  sessionStorage.clear();
  expect(undeclared.take(), 'requests that no handler of this test declared').toEqual([]);
});
afterAll(() => server.close());
