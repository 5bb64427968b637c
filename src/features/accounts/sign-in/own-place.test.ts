import { describe, expect, it } from 'vitest';
import { ownPlace } from './own-place.ts';

describe('ownPlace', () => {
  it('keeps a page of this site with its search', () => {
    expect(ownPlace('/clips/1?frame=4#x')).toBe('/clips/1?frame=4#x');
  });
  it.each([
    null,
    '',
    'https://elsewhere.example/',
    '//elsewhere.example/x',
    '/\\elsewhere.example',
    'javascript:alert(1)',
    'athletes',
  ])('leads to Today for %s', (to) => {
    expect(ownPlace(to)).toBe('/');
  });
});
