import { spawn } from 'node:child_process';
import { createInterface } from 'node:readline';
import { confine, confinement, readLimits } from './confinement.ts';
import { MediaFailure } from './failures.ts';
import { throwForMachine, type ToolOutcome } from './tool-outcome.ts';

/**
 * Runs ffprobe and hands over its output line by line; a line handler that answers `false` has seen
 * enough and ends the run. fluent-ffmpeg's own ffprobe drops packets, hence this one.
 */
export async function runFfprobe(
  args: readonly string[],
  onLine: (line: string) => void | false,
  signal?: AbortSignal,
): Promise<ToolOutcome> {
  if (signal?.aborted) throw new MediaFailure('cancelled');
  const prefix = confine(await confinement(), readLimits, process.env.PATH);
  const [command = 'ffprobe', ...rest] = [...prefix, 'ffprobe', ...args];
  const child = spawn(command, rest, { stdio: ['ignore', 'pipe', 'pipe'] });
  const stop = () => child.kill('SIGKILL');
  signal?.addEventListener('abort', stop, { once: true });
  const complaints: string[] = [];
  createInterface(child.stderr).on('line', (line) => {
    complaints.push(line);
    if (complaints.length > 40) complaints.shift();
  });
  let seenEnough = false;
  createInterface(child.stdout).on('line', (line) => {
    if (seenEnough || onLine(line) !== false) return;
    seenEnough = true;
    stop();
  });
  try {
    const outcome = await new Promise<ToolOutcome>((resolve, reject) => {
      child.once('error', (error: NodeJS.ErrnoException) =>
        reject(new MediaFailure(error.code === 'ENOENT' ? 'tool-missing' : 'tool-failed')),
      );
      child.once('close', (exitCode, killed) => resolve({ exitCode, signal: killed, complaints }));
    });
    if (signal?.aborted) throw new MediaFailure('cancelled');
    throwForMachine(outcome);
    return outcome;
  } finally {
    signal?.removeEventListener('abort', stop);
  }
}
