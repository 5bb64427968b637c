import { execFile } from 'node:child_process';
import { promisify } from 'node:util';

const execFileAsync = promisify(execFile);

/** Bounds of one run of ffmpeg or ffprobe. */
export interface Limits {
  /** address space */
  readonly memoryBytes: number;
  readonly cpuSeconds: number;
  /** largest file it may write */
  readonly fileBytes: number;
}

export const readLimits: Limits = {
  memoryBytes: 2 * 1024 ** 3,
  cpuSeconds: 300,
  fileBytes: 256 * 1024 ** 2,
};
/** 7,200 frames of 4K HEVC with tone mapping took under an hour of one core. */
export const prepareLimits: Limits = {
  memoryBytes: 6 * 1024 ** 3,
  cpuSeconds: 3 * 3600,
  fileBytes: 4 * 1024 ** 3,
};

/** What holds on this machine, for the doctor's page: true only where it was tried and worked. */
export interface Confinement {
  /** lower priority than the web server */
  readonly priority: boolean;
  /** memory, computing time and file size are bounded */
  readonly limits: boolean;
  /** no network: 'root' = own network namespace, 'user' = through a user namespace */
  readonly network: 'root' | 'user' | false;
  /** the tool dies with the worker that started it */
  readonly diesWithParent: boolean;
  /** the tool sees no variable of the server's environment */
  readonly bareEnvironment: boolean;
}

let detected: Promise<Confinement> | undefined;

/** Tries each means once per process. */
export function confinement(): Promise<Confinement> {
  detected ??= detect();
  return detected;
}

async function detect(): Promise<Confinement> {
  const works = async (...[command, ...args]: [string, ...string[]]) => {
    try {
      await execFileAsync(command, args, { timeout: 5000 });
      return true;
    } catch {
      return false;
    }
  };
  const [priority, limits, root, user, diesWithParent, bareEnvironment] = await Promise.all([
    works('nice', '-n', '10', 'true'),
    works('prlimit', '--core=0', '--cpu=60', '--', 'true'),
    works('unshare', '-n', '--', 'true'),
    works('unshare', '-rn', '--', 'true'),
    works('setpriv', '--no-new-privs', '--pdeathsig', 'KILL', '--', 'true'),
    works('env', '-i', 'true'),
  ]);
  const network = root ? 'root' : user ? 'user' : false;
  return { priority, limits, network, diesWithParent, bareEnvironment };
}

/**
 * The commands to put before the tool's own, outermost first. Each replaces itself by the next, so
 * that the process id that was started is the tool's. `setpriv` stands last: entering a user
 * namespace would clear what it sets.
 */
export function confine(holds: Confinement, limits: Limits, path: string | undefined): string[] {
  return [
    ...(holds.bareEnvironment ? ['env', '-i', `PATH=${path ?? ''}`, 'LC_ALL=C.UTF-8'] : []),
    ...(holds.network === 'root' ? ['unshare', '-n', '--'] : []),
    ...(holds.network === 'user' ? ['unshare', '-rn', '--'] : []),
    ...(holds.limits
      ? [
          'prlimit',
          `--as=${limits.memoryBytes}`,
          `--cpu=${limits.cpuSeconds}`,
          `--fsize=${limits.fileBytes}`,
          '--core=0',
          '--',
        ]
      : []),
    ...(holds.priority ? ['nice', '-n', '10'] : []),
    ...(holds.diesWithParent ? ['setpriv', '--no-new-privs', '--pdeathsig', 'KILL', '--'] : []),
  ];
}
