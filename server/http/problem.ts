import { type Fault, type ProblemCode, PROBLEMS } from '#shared/contracts/problems.ts';

/** Every way in which the server says no. Throw it anywhere; one handler answers. */
export class Problem extends Error {
  override readonly name = 'Problem';
  readonly code: ProblemCode;
  readonly detail: string | undefined;
  readonly faults: readonly Fault[] | undefined;

  /**
   * @param detail one plain sentence about this occurrence, for the person; never a name, a path or SQL
   * @param faults every fault of an input, not the first
   */
  constructor(code: ProblemCode, detail?: string, faults?: readonly Fault[]) {
    super(detail ?? PROBLEMS[code][1]);
    this.code = code;
    this.detail = detail;
    this.faults = faults;
  }

  get status(): number {
    return PROBLEMS[this.code][0];
  }
}
