import { readdir } from 'node:fs/promises';
import { cpus, totalmem } from 'node:os';
import { type BenchEntry, type EntryReport, judge } from './entry.ts';
import { asTable } from './table.ts';

/**
 * Runs every entry of `entries/` and prints a table, or with `--json` one JSON document.
 * `--only WORD` runs the entries whose file name holds the word. Ends with 1 where a target was
 * missed or an entry failed.
 */

const asJson = process.argv.includes('--json');
const only = process.argv.includes('--only')
  ? process.argv[process.argv.indexOf('--only') + 1]
  : undefined;

const folder = new URL('entries/', import.meta.url);

const load = async (file: string): Promise<BenchEntry> => {
  const module = (await import(new URL(file, folder).href)) as { default: BenchEntry };
  return module.default;
};

const runEntry = async (entry: BenchEntry): Promise<EntryReport> => {
  const { name, target } = entry;
  try {
    const result = await entry.run();
    return { name, target, verdict: judge(target, result.ratio), ...result };
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    return { name, target, verdict: 'failed', ratio: null, a: null, b: null, info: { why } };
  }
};

const files = (await readdir(folder))
  .filter((file) => file.endsWith('.ts') && file.includes(only ?? ''))
  .sort();
const reports: EntryReport[] = [];
for (const file of files) {
  const entry = await load(file);
  if (!asJson) process.stderr.write(`${entry.name} …\n`);
  reports.push(await runEntry(entry));
}

const machine = {
  processors: cpus().length,
  model: cpus()[0]?.model ?? null,
  memoryGB: Math.round(totalmem() / 2 ** 30),
  node: process.version,
};
console.log(
  asJson
    ? JSON.stringify({ at: new Date().toISOString(), machine, entries: reports }, null, 2)
    : asTable(reports),
);
process.exitCode = reports.some(({ verdict }) => verdict === 'missed' || verdict === 'failed')
  ? 1
  : 0;
