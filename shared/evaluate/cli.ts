import { createReadStream, readFileSync } from 'node:fs';
import { stdin } from 'node:process';
import { createInterface } from 'node:readline';
import { type ReadingRules, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { linesOf } from './lines.ts';
import { evaluateOptions, USAGE } from './options.ts';
import { rulesFrom } from './rules-file.ts';

/** The rules of a protocol's file, or what is wrong with it. */
const rulesOfFile = (file: string | null): ReadingRules | string => {
  try {
    return file === null ? STANDARD_RULES : rulesFrom(readFileSync(file, 'utf8'));
  } catch (error) {
    return `The protocol ${file ?? ''}: ${error instanceof Error ? error.message : String(error)}`;
  }
};

/**
 * npm run --silent evaluate -- [--engine N] [--protocol FILE.json] FILE.jsonl
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
  const { file, engine, protocol } = asked;
  const rules = rulesOfFile(protocol);
  if (typeof rules === 'string') {
    console.error(rules);
    return 2;
  }
  let status = 0;
  let number = 0;
  const input = file === '-' ? stdin : createReadStream(file, 'utf8');
  for await (const line of createInterface({ input, crlfDelay: Infinity })) {
    number += 1;
    if (line.trim() === '') continue;
    const { lines, error } = linesOf(line, engine, rules);
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
