import { execFile } from 'node:child_process';
import { promisify } from 'node:util';

const run = promisify(execFile);

/** Presentation times of a file's pictures from the first one on, ms, in order. */
export const probedTimes = async (file: string): Promise<readonly number[]> => {
  const { stdout } = await run(
    'ffprobe',
    [
      ...['-v', 'error', '-select_streams', 'v:0'],
      ...['-show_entries', 'packet=pts_time,flags', '-of', 'csv=p=0', file],
    ],
    { maxBuffer: 1 << 26 },
  );
  const times = stdout
    .split('\n')
    .map((line) => line.split(','))
    .filter(([time, flags]) => time !== undefined && time !== '' && !(flags ?? '').includes('D'))
    .map(([time]) => Number(time))
    .sort((a, b) => a - b);
  return times.map((time) => (time - (times[0] ?? 0)) * 1000);
};

/** Files give times in millionths of a second. */
const TOLERANCE_MS = 0.002;

/** Fails unless the file shows as many pictures as the truth has, each at its time. */
export const checkTimes = async (file: string, timesMs: readonly number[]): Promise<void> => {
  const found = await probedTimes(file);
  if (found.length !== timesMs.length)
    throw new Error(`${file} holds ${found.length} pictures instead of ${timesMs.length}`);
  const wrong = found.findIndex(
    (time, index) => Math.abs(time - (timesMs[index] ?? NaN)) > TOLERANCE_MS,
  );
  if (wrong >= 0)
    throw new Error(
      `${file}: picture ${wrong} stands at ${found[wrong]} ms, not ${timesMs[wrong]} ms`,
    );
};
