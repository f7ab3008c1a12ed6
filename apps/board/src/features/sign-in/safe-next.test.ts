import { describe, expect, it } from 'vitest';
import { safeNext } from './safe-next.ts';

describe('where to go after sign-in', () => {
  it.each(['/my-work', '/board?lane=speech', '/children/019-a/record', '/team'])('%s is our own', (next) => {
    expect(safeNext(next)).toBe(next);
  });

  it.each([
    '//evil.example',
    '/\\evil',
    '\\\\evil.example',
    'https://evil.example',
    'javascript:alert(1)',
    '/board\\..\\evil',
    '/boardroom',
    '/sign-in',
    '/../../evil',
    '/api/v1/session',
    '',
    '/team/..//evil.example',
    ' /board',
    '/\t/evil.example',
  ])('X06 %j is not followed', (next) => {
    expect(safeNext(next)).toBeNull();
  });

  it('nothing asked for is nothing', () => {
    expect(safeNext(null)).toBeNull();
  });
});
