import { createReadStream } from 'node:fs';
import { stdin } from 'node:process';
import { createInterface } from 'node:readline';
import { linesOf } from './lines.ts';
import { evaluateOptions, USAGE } from './options.ts';

/**
 * npm run --silent evaluate -- [--engine N] FILE.jsonl
 *
 * Reads one trial per line ('-' reads standard input) and prints one line of JSON per trial and
 * landmark set. A bad line is named on standard output and in words on standard error; the rest is
 * still done, and the exit status is 1.
 */
const main = async (): Promise<number> => {
  const asked = evaluateOptions(process.argv.slice(2));
  if (!asked) {
    console.error(`Usage: ${USAGE}`);
    return 2;
  }
  const { file, engine } = asked;
  let status = 0;
  let number = 0;
  const input = file === '-' ? stdin : createReadStream(file, 'utf8');
  for await (const line of createInterface({ input, crlfDelay: Infinity })) {
    number += 1;
    if (line.trim() === '') continue;
    const { lines, error } = linesOf(line, engine);
    for (const result of lines) console.log(JSON.stringify(result));
    if (error === null) continue;
    status = 1;
    console.log(JSON.stringify({ line: number, error }));
    console.error(`Line ${number}: ${error}. The other lines are done.`);
  }
  return status;
};

main().then(
  (status) => {
    process.exitCode = status;
  },
  (error: unknown) => {
    console.error(
      `Cannot read the file: ${error instanceof Error ? error.message : String(error)}`,
    );
    process.exitCode = 2;
  },
);
