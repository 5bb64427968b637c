import { describe, expect, it } from 'vitest';
import { type Confinement, confine, confinement, readLimits } from './confinement.ts';
import { MediaFailure } from './failures.ts';
import { readEnd } from './run-ffmpeg.ts';
import { throwForMachine, withoutPaths } from './tool-outcome.ts';

const all: Confinement = {
  priority: true,
  limits: true,
  network: 'root',
  diesWithParent: true,
  bareEnvironment: true,
};

describe('confinement', () => {
  it('puts each means before the tool, the bond to the worker last', () => {
    expect(confine(all, { memoryBytes: 1, cpuSeconds: 2, fileBytes: 3 }, '/usr/bin')).toEqual([
      ...['env', '-i', 'PATH=/usr/bin', 'LC_ALL=C.UTF-8', 'unshare', '-n', '--'],
      ...['prlimit', '--as=1', '--cpu=2', '--fsize=3', '--core=0', '--'],
      ...['nice', '-n', '10', 'setpriv', '--no-new-privs', '--pdeathsig', 'KILL', '--'],
    ]);
  });

  it('leaves out what this machine does not permit', () => {
    const none: Confinement = {
      priority: false,
      limits: false,
      network: false,
      diesWithParent: false,
      bareEnvironment: false,
    };
    expect(confine(none, readLimits, '/usr/bin')).toEqual([]);
    expect(confine({ ...none, network: 'user' }, readLimits, '')).toEqual(['unshare', '-rn', '--']);
  });

  it('is tried once and says what holds', async () => {
    const first = confinement();
    expect(confinement()).toBe(first);
    expect(Object.keys(await first).sort()).toEqual(Object.keys(all).sort());
  });
});

describe('how a tool ended', () => {
  const ended =
    (exitCode: number | null, signal: string | null, ...complaints: string[]) =>
    () =>
      throwForMachine({ exitCode, signal, complaints });

  it('tells the machine’s faults from the clip’s', () => {
    expect(ended(1, null, 'av_interleaved_write_frame(): No space left on device')).toThrow(
      expect.objectContaining({ name: 'MediaFailure', code: 'no-space' }),
    );
    expect(
      ended(127, null, 'setpriv: failed to execute ffmpeg: No such file or directory'),
    ).toThrow(MediaFailure);
    expect(ended(null, 'SIGXCPU')).toThrow(expect.objectContaining({ code: 'too-costly' }));
    expect(ended(1, null, 'Cannot allocate memory')).toThrow(
      expect.objectContaining({ code: 'too-costly' }),
    );
    expect(ended(1, null, 'moov atom not found')).not.toThrow();
  });

  it('is read from the words of the package behind the adapter', () => {
    expect(readEnd('ffmpeg exited with code 69: bad')).toEqual({ exitCode: 69, signal: null });
    expect(readEnd('ffmpeg was killed with signal SIGKILL')).toEqual({
      exitCode: null,
      signal: 'SIGKILL',
    });
    expect(readEnd('spawn ffmpeg ENOENT')).toBeNull();
  });

  it('is logged without paths, which may hold a name', () => {
    const line = withoutPaths(['[in @ 0x1] /srv/clips/Some One.mp4: Invalid data']);
    expect(line).not.toContain('clips');
    expect(line).toContain('Invalid data');
  });
});
