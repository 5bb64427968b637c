import { describe, expect, it } from 'vitest';
import { networkOf } from './asker.ts';

describe('the address in the audit trail', () => {
  it.each([
    ['203.0.113.77', '203.0.113.0/24'],
    ['::ffff:203.0.113.77', '203.0.113.0/24'],
    ['2001:db8:12:34:56:78:9a:bc', '2001:db8:12::/48'],
    ['2001:0DB8::1', '2001:db8:0::/48'],
    ['fe80::1%eth0', 'fe80:0:0::/48'],
    ['::1', '0:0:0::/48'],
  ])('of %s is %s', (address, network) => {
    expect(networkOf(address)).toBe(network);
  });

  it('is unknown where it is no address', () => {
    expect(networkOf(undefined)).toBeNull();
    expect(networkOf('somewhere')).toBeNull();
  });
});
