import { describe, expect, it } from 'vitest';
import { STANDARD_PROTOCOL, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { rulesFrom } from './rules-file.ts';

describe('the protocol of evaluate', () => {
  it('takes what is written, and the standard for the rest', () => {
    expect(rulesFrom('{"gateFrom": 55, "early": 0.98}')).toEqual({
      ...STANDARD_RULES,
      gateFrom: 55,
      early: 0.98,
    });
    expect(rulesFrom('{}')).toEqual(STANDARD_RULES);
  });

  it('takes a practice’s whole protocol, without what only new work starts from', () => {
    expect(rulesFrom(JSON.stringify(STANDARD_PROTOCOL))).toEqual(STANDARD_RULES);
  });

  it.each([
    ['gateFrom=55', /is not JSON/],
    ['[55, 90]', /must be one object/],
    ['null', /must be one object/],
    ['{"lower": 55}', /'lower' is none of gateFrom, gateTo/],
    ['{"toString": 1}', /'toString' is none of/],
    ['{"gateFrom": "55"}', /gateFrom must be a number/],
    ['{"early": null}', /early must be a number/],
    ['{"gateFrom": 20}', /^gateFrom: Choose 45° to 80°\.$/],
    ['{"early": 95}', /^early: Choose 90 in 100 to 99 in 100\.$/],
    ['{"gateFrom": 75}', /^gateTo: Put the gates at least 20° apart/],
    ['{"gateFrom": 20, "gateTo": 120}', /^gateFrom: .* gateTo: Choose 65° to 100°\.$/],
  ])('says what is wrong with %s', (text, words) => {
    expect(() => rulesFrom(text)).toThrow(words);
  });
});
