import { describe, expect, it } from 'vitest';
import { changed, queryOf } from './audit-address.ts';

const person = '00000000-0000-4000-8000-000000000001';

describe('the trail’s address', () => {
  it('takes whole days, from the first midnight here to the one after the last', () => {
    expect(queryOf(new URLSearchParams('from=2026-03-28&to=2026-03-31'))).toEqual({
      from: new Date(2026, 2, 28).toISOString(),
      to: new Date(2026, 3, 1).toISOString(),
    });
  });

  it('leaves out what it has wrong, field by field', () => {
    const search = new URLSearchParams(`person=${person}&athlete=x&action=dance&from=May&page=2`);
    expect(queryOf(search)).toEqual({ person, page: '2' });
  });

  it('starts at the first page after any change but of the page', () => {
    const search = new URLSearchParams('page=3');
    expect(changed(search, 'action', 'clip.open').toString()).toBe('action=clip.open');
    expect(changed(search, 'page', '4').toString()).toBe('page=4');
    expect(changed(search, 'page', '1').toString()).toBe('');
  });
});
