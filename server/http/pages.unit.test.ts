import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express from 'express';
import supertest from 'supertest';
import { afterAll, describe, expect, it } from 'vitest';
import { servePages } from './pages.ts';

const folder = mkdtempSync(join(tmpdir(), 'redshank-pages-'));
mkdirSync(join(folder, 'assets'));
writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Redshank</title>');
writeFileSync(join(folder, 'replay.html'), '<!doctype html><title>Your replay</title>');
writeFileSync(join(folder, 'assets', 'app-1a2b3c.js'), 'export {};');
writeFileSync(join(folder, 'icon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
afterAll(() => {
  rmSync(folder, { recursive: true });
});

const app = express();
app.use(servePages(folder, (token) => Promise.resolve(token === 'live')));
const get = (path: string) => supertest(app).get(path);

describe('the pages', () => {
  it('are one document at every path that is not a file', async () => {
    for (const path of ['/', '/athletes', '/clips/1', '/practice/people']) {
      const answer = await get(path).expect(200);
      expect(answer.text).toContain('<title>Redshank</title>');
      expect(answer.headers['cache-control']).toBe('no-cache');
    }
  });

  it('have hashed files that are kept for good', async () => {
    const answer = await get('/assets/app-1a2b3c.js').expect(200);
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    await get('/icon.svg').expect(200);
  });

  it('answer 404 for a file that is not there, never the document', async () => {
    for (const path of ['/assets/app-old.js', '/robots.txt', '/assets/', '/assets/x']) {
      const answer = await get(path).expect(404);
      expect(answer.text).not.toContain('<title>');
    }
  });

  it('give a replay link its own small page, with 404 where the link is dead', async () => {
    const live = await get('/r/live').expect(200);
    expect(live.text).toContain('<title>Your replay</title>');
    const dead = await get('/r/dead').expect(404);
    expect(dead.text).toContain('<title>Your replay</title>');
  });
});
