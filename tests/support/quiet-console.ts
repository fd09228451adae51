import { afterEach, beforeEach, expect, vi } from 'vitest';

/** Whatever is printed as an error or a warning while a test runs fails it. */
const spies = () => [vi.spyOn(console, 'error'), vi.spyOn(console, 'warn')];
let watching: ReturnType<typeof spies> = [];

beforeEach(() => {
  watching = spies();
});

afterEach(() => {
  const printed = watching.flatMap((spy) => spy.mock.calls.map((call) => call.map(String).join(' ')));
  for (const spy of watching) spy.mockRestore();
  expect(printed, 'nothing is printed to the console').toEqual([]);
});
