/** Longest stretch of work during which messages wait, ms. */
const WORK_MS = 8;
/** How often one looks whether it may go on, ms. */
const LOOK_AGAIN_MS = 40;

/** Lets the messages that have come be heard; a timer would wait 4 ms each time. */
const turn = (): Promise<void> =>
  new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });

const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** Gives way: to messages now and then, and to the person who steps through the clip. */
export class Breather {
  #heldUntil = 0;
  #lastTurn = 0;

  giveWay(ms: number): void {
    this.#heldUntil = Math.max(this.#heldUntil, performance.now() + ms);
  }

  get held(): boolean {
    return performance.now() < this.#heldUntil;
  }

  /** `meanwhile` is called at each look while it is held; what it throws ends the wait. */
  async breathe(meanwhile: () => Promise<void> | void): Promise<void> {
    if (performance.now() - this.#lastTurn > WORK_MS) {
      await turn();
      this.#lastTurn = performance.now();
    }
    await meanwhile();
    while (this.held) {
      await pause(Math.min(LOOK_AGAIN_MS, Math.max(1, this.#heldUntil - performance.now())));
      await meanwhile();
    }
  }
}
