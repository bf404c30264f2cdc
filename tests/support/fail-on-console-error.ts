import { afterEach, beforeEach, expect, vi } from 'vitest';

beforeEach(() => {
  vi.spyOn(console, 'error');
});

afterEach(() => {
  expect(vi.mocked(console.error).mock.calls, 'console.error was called').toEqual([]);
  vi.restoreAllMocks();
});
