import { afterEach, beforeEach, expect, vi } from 'vitest';

/** Whatever reaches console.error during a test fails that test. */
beforeEach(() => {
  vi.spyOn(console, 'error');
});

afterEach(() => {
  expect(console.error, 'console.error was called').not.toHaveBeenCalled();
  vi.restoreAllMocks();
});
