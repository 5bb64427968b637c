import { CURRENT_ENGINE, type EngineVersion, engineOf, ENGINES } from '#shared/reading/engine.ts';

export interface EvaluateOptions {
  readonly file: string;
  readonly engine: EngineVersion;
}

export const USAGE = `npm run --silent evaluate -- [--engine ${ENGINES.join('|')}] FILE.jsonl   (one trial per line)`;

/** What the command line asks for; null where it is not understood. */
export const evaluateOptions = (args: readonly string[]): EvaluateOptions | null => {
  const at = args.indexOf('--engine');
  const engine = at < 0 ? CURRENT_ENGINE : engineOf(args[at + 1]);
  const [file, ...more] = at < 0 ? args : [...args.slice(0, at), ...args.slice(at + 2)];
  if (engine === null || file === undefined || more.length > 0) return null;
  return file === '-' || !file.startsWith('-') ? { file, engine } : null;
};
