import { cleanup, configure } from '@testing-library/react';
import { afterEach, beforeEach, vi } from 'vitest';

// A shared machine may be slow: waiting longer costs nothing where the thing waited for comes.
configure({ asyncUtilTimeout: 8000 });

/**
 * Browser parts that jsdom lacks and the pages use; each does the least that the markup needs.
 * An unexpected console.error fails the test in which it was written.
 */
let errors: string[] = [];

beforeEach(() => {
  errors = [];
  vi.spyOn(console, 'error').mockImplementation((...parts: unknown[]) => {
    errors.push(parts.map(String).join(' '));
  });
});

afterEach(() => {
  cleanup();
  window.localStorage.clear();
  const written = errors;
  vi.restoreAllMocks();
  if (written.length > 0) throw new Error(`console.error was called:\n${written.join('\n')}`);
});

if (!window.matchMedia) {
  window.matchMedia = (query: string): MediaQueryList => ({
    matches: false,
    media: query,
    onchange: null,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
    addListener: () => undefined,
    removeListener: () => undefined,
    dispatchEvent: () => false,
  });
}

if (!HTMLDialogElement.prototype.showModal) {
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.setAttribute('open', '');
  };
  HTMLDialogElement.prototype.close = function close() {
    if (!this.hasAttribute('open')) return;
    this.removeAttribute('open');
    this.dispatchEvent(new Event('close'));
  };
}

globalThis.ResizeObserver ??= class implements ResizeObserver {
  observe(): void {}
  unobserve(): void {}
  disconnect(): void {}
};

Element.prototype.scrollIntoView ??= () => undefined;
window.scrollTo = () => undefined;
