import '@testing-library/jest-dom/vitest';
import { cleanup } from '@testing-library/react';
import { afterEach, beforeEach, expect, vi } from 'vitest';

let said: unknown[][] = [];

// Noise is a defect: whatever a component says on the console fails the test that made it say so.
beforeEach(() => {
  said = [];
  vi.spyOn(console, 'error').mockImplementation((...words: unknown[]) => void said.push(words));
  vi.spyOn(console, 'warn').mockImplementation((...words: unknown[]) => void said.push(words));
});

afterEach(() => {
  cleanup();
  vi.restoreAllMocks();
  expect(said, 'nothing may be written to the console').toEqual([]);
});
