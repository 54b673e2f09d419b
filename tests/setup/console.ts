import { afterEach, beforeEach, vi } from 'vitest';

/** An unexpected console.error fails the test in which it was written; a test that expects one spies on it itself. */
let errors: string[] = [];

beforeEach(() => {
  errors = [];
  vi.spyOn(console, 'error').mockImplementation((...parts: unknown[]) => {
    errors.push(parts.map(String).join(' '));
  });
});

afterEach(() => {
  const written = errors;
  vi.restoreAllMocks();
  if (written.length > 0) throw new Error(`console.error was called:\n${written.join('\n')}`);
});
