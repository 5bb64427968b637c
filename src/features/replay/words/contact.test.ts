import { describe, expect, it } from 'vitest';
import { contactParts } from './contact.ts';

describe('how to reach the practice', () => {
  it.each([
    ['01632 960 114', [['01632 960 114', 'tel:01632960114']]],
    [
      'Greywater Row, reception: 0555 0142',
      [
        ['Greywater Row, reception: ', null],
        ['0555 0142', 'tel:05550142'],
      ],
    ],
    [
      'desk@greywater-row.example',
      [['desk@greywater-row.example', 'mailto:desk@greywater-row.example']],
    ],
    ['room 12', [['room 12', null]]],
    ['', []],
  ])('%s', (contact, parts) => {
    expect(contactParts(contact).map(({ text, to }) => [text, to])).toEqual(parts);
  });
});
