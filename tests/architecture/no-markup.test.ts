import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

const root = fileURLToPath(new URL('../../', import.meta.url));
const sources = ['src', 'shared', 'server'].flatMap((room) =>
  readdirSync(join(root, room), { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.tsx?$/.test(name) && !/\.test\.tsx?$/.test(name))
    .map((name) => join(room, name)),
);

describe('the product’s own code', () => {
  it('makes no markup and no code from text', () => {
    const never =
      /dangerouslySetInnerHTML|\.(inner|outer)HTML\b|insertAdjacentHTML|document\.write|\beval\(|new Function\(|javascript:/;
    expect(sources.length).toBeGreaterThan(500);
    const found = sources.filter((name) => never.test(readFileSync(join(root, name), 'utf8')));
    expect(found).toEqual([]);
  });
});

describe.each(['index.html', 'replay.html'])('%s', (name) => {
  const page = readFileSync(join(root, name), 'utf8');

  it('has no script, style or handler inside, and nothing from elsewhere', () => {
    expect(page.match(/<script\b[^>]*>/g)).toEqual([
      expect.stringMatching(/^<script type="module" src="\/src\/[^"]+">$/),
    ]);
    expect(page).not.toMatch(/<style\b|\sstyle=|\son\w+=|https?:|src="\/\//);
  });
});
