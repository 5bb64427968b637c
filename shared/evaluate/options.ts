import { CURRENT_ENGINE, type EngineVersion, engineOf, ENGINES } from '#shared/reading/engine.ts';

export interface EvaluateOptions {
  readonly file: string;
  readonly engine: EngineVersion;
  /** File with the gates and limits to read with; null: the standard. */
  readonly protocol: string | null;
}

export const USAGE = `npm run --silent evaluate -- [--engine ${ENGINES.join('|')}] [--protocol FILE.json] FILE.jsonl
  FILE.jsonl  one trial per line; - reads standard input
  --protocol  gates and limits to read with, such as {"gateFrom": 55, "gateTo": 90}; what it leaves out is the standard's`;

const isFile = (word: string): boolean => !word.startsWith('-');

/** What the command line asks for; null where it is not understood. */
export const evaluateOptions = (args: readonly string[]): EvaluateOptions | null => {
  const files: string[] = [];
  let engine: EngineVersion | null = CURRENT_ENGINE;
  let protocol: string | null = null;
  for (let at = 0; at < args.length; at += 1) {
    const word = args[at] ?? '';
    if (word === '--engine') {
      at += 1;
      engine = engineOf(args[at]);
    } else if (word === '--protocol') {
      at += 1;
      protocol = args[at] ?? '-';
    } else files.push(word);
  }
  const [file, ...more] = files;
  if (engine === null || file === undefined || more.length > 0) return null;
  if (protocol !== null && !isFile(protocol)) return null;
  return file === '-' || isFile(file) ? { file, engine, protocol } : null;
};
