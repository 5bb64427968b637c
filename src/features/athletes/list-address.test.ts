import { describe, expect, it } from 'vitest';
import { changed, queryOf } from './list-address.ts';

describe('the list’s address', () => {
  it('takes what the contract takes and leaves out the rest', () => {
    const search = new URLSearchParams('q=Ines&consent=maybe&sort=-lastVisit&page=0&x=1');
    expect(queryOf(search)).toEqual({ q: 'Ines', sort: '-lastVisit' });
  });
  it('starts at the first page when anything else changes', () => {
    const search = new URLSearchParams('q=Ines&page=3');
    expect(changed(search, 'consent', 'none').toString()).toBe('q=Ines&consent=none');
    expect(changed(search, 'q', '').toString()).toBe('');
    expect(changed(search, 'page', '2').toString()).toBe('q=Ines&page=2');
    expect(changed(search, 'page', '1').toString()).toBe('q=Ines');
  });
});
