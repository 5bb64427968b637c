import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';

/** ffmpeg reading raw pictures from a pipe. */
export class Encoder {
  private readonly child: ChildProcess;
  private readonly ended: Promise<void>;

  constructor(args: readonly string[]) {
    this.child = spawn('ffmpeg', [...args], { stdio: ['pipe', 'ignore', 'pipe'] });
    let said = '';
    this.child.stderr?.on('data', (chunk: Buffer) => (said += chunk.toString()));
    this.ended = new Promise((resolve, reject) => {
      this.child.on('error', (cause) => reject(new Error('ffmpeg did not start', { cause })));
      this.child.on('close', (code) =>
        code === 0 ? resolve() : reject(new Error(`ffmpeg ended with ${String(code)}: ${said}`)),
      );
    });
    // an early end is reported by finish(); writing to it must not crash the process first
    this.ended.catch(() => undefined);
    this.child.stdin?.on('error', () => undefined);
  }

  /** Resolves when the picture may be reused and another may follow. */
  async write(picture: Uint8Array): Promise<void> {
    const pipe = this.child.stdin;
    if (pipe === null || pipe.destroyed) return this.ended;
    if (!pipe.write(picture)) await Promise.race([once(pipe, 'drain'), this.ended]);
  }

  async finish(): Promise<void> {
    this.child.stdin?.end();
    await this.ended;
  }
}
