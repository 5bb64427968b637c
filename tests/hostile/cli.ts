import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { hostileFiles } from './files.ts';
import { tryFile } from './try-file.ts';

/**
 * `npm run hostile`: tries every damaged or hostile file, prints how many had which outcome and the sentences by
 * which they were refused. Ends with 1 where one was neither prepared nor refused.
 */
const folder = await mkdtemp(join(tmpdir(), 'hostile-'));
const outcomes = new Map<string, { count: number; said: string; name: string }>();
let failures = 0;
try {
  const files = await hostileFiles(join(folder, 'sound'));
  for (const file of files) {
    try {
      const outcome = await tryFile(file, folder);
      const said = 'said' in outcome ? outcome.said : '';
      const count = (outcomes.get(outcome.code)?.count ?? 0) + 1;
      outcomes.set(outcome.code, { count, said, name: file.name });
    } catch (error) {
      failures += 1;
      console.error(error);
    }
  }
  for (const [code, { count, said, name }] of outcomes)
    console.log(`${String(count).padStart(4)} ${code.padEnd(22)} ${said} (${name})`);
  console.log(`${files.length} files, ${failures} neither prepared nor refused`);
} finally {
  await rm(folder, { recursive: true, force: true });
}
process.exitCode = failures === 0 ? 0 : 1;
