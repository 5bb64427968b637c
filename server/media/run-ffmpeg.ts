import ffmpeg from 'fluent-ffmpeg';
import { confine, confinement, type Limits } from './confinement.ts';
import { MediaFailure } from './failures.ts';
import type { FfmpegJob } from './ffmpeg-job.ts';
import { throwForMachine, type ToolOutcome, withoutPaths } from './tool-outcome.ts';

export interface RunOptions {
  readonly limits: Limits;
  /** frames written so far to the first output */
  readonly onFrame?: (frames: number) => void;
  readonly signal?: AbortSignal;
}

export interface FfmpegOutcome extends ToolOutcome {
  /** decoded frames that ffmpeg itself calls corrupt: painted over from their neighbours */
  readonly corruptFrames: number;
}

let capabilities: Promise<void> | undefined;

/** fluent-ffmpeg asks ffmpeg for its formats and encoders once and remembers; that must run unconfined. */
const knowCapabilities = () =>
  (capabilities ??= new Promise<void>((resolve, reject) => {
    ffmpeg().setFfmpegPath('ffmpeg');
    ffmpeg.getAvailableFormats((noFormats) =>
      ffmpeg.getAvailableEncoders((noEncoders) => {
        if (!noFormats && !noEncoders) return resolve();
        capabilities = undefined;
        reject(new MediaFailure('tool-missing'));
      }),
    );
  }));

/**
 * Runs a job. The only place that knows fluent-ffmpeg. Its 'progress' event is left alone, because
 * listening to it makes the package probe the input without our whitelists; ffmpeg's own progress
 * lines are read instead.
 */
export async function runFfmpeg(job: FfmpegJob, options: RunOptions): Promise<FfmpegOutcome> {
  const { signal } = options;
  if (signal?.aborted) throw new MediaFailure('cancelled');
  await knowCapabilities();
  const prefix = confine(await confinement(), options.limits, process.env.PATH);
  const [first = 'ffmpeg', ...before] = [...prefix, 'ffmpeg'];
  const command = ffmpeg(job.input.path).setFfmpegPath(first);
  command.inputOptions(...before, ...job.input.args).complexFilter(job.graph);
  for (const output of job.outputs) command.output(output.path).outputOptions(...output.args);

  const complaints: string[] = [];
  let corruptFrames = 0;
  command.on('stderr', (line: string) => {
    const frames = /^frame=\s*(\d+)$/.exec(line);
    if (frames) return options.onFrame?.(Number(frames[1]));
    if (/^[a-z_0-9]+=/.test(line) || line.trim() === '') return;
    if (line.includes('corrupt decoded frame')) corruptFrames += 1;
    complaints.push(line);
    if (complaints.length > 40) complaints.shift();
  });
  const stop = () => command.kill('SIGKILL');
  // a signal raised before the process exists is seen as soon as it does
  command.on('start', () => (signal?.aborted ? stop() : undefined));
  signal?.addEventListener('abort', stop, { once: true });
  try {
    const end = await new Promise<ProcessEnd>((resolve, reject) => {
      command.once('end', () => resolve({ exitCode: 0, signal: null }));
      command.once('error', (error: Error) => {
        const known = readEnd(error.message);
        if (known) resolve(known);
        else reject(new MediaFailure('tool-failed', withoutPaths([error.message])));
      });
      command.run();
    });
    if (signal?.aborted) throw new MediaFailure('cancelled');
    const outcome = { ...end, complaints, corruptFrames };
    throwForMachine(outcome);
    return outcome;
  } finally {
    signal?.removeEventListener('abort', stop);
  }
}

type ProcessEnd = Pick<ToolOutcome, 'exitCode' | 'signal'>;

/** fluent-ffmpeg reports the end in words; null where they are not about the process's end. */
export function readEnd(message: string): ProcessEnd | null {
  const killed = /killed with signal (SIG\w+)/.exec(message)?.[1];
  const code = /exited with code (\d+)/.exec(message)?.[1];
  return killed || code ? { exitCode: code ? Number(code) : null, signal: killed ?? null } : null;
}
