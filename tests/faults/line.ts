import { once } from 'node:events';
import { connect, createServer, type AddressInfo, type Socket } from 'node:net';

/** A way between two parts of an instance on this machine, that can be cut. */
export interface Line {
  /** Where its near end listens, on 127.0.0.1. */
  readonly port: number;
  /** What is under way ends in the middle, and nothing new comes through. */
  readonly cut: () => void;
  readonly mend: () => void;
  readonly close: () => Promise<void>;
}

/** @param far the port of its far end, on 127.0.0.1 */
export const openLine = async (far: number): Promise<Line> => {
  const open = new Set<Socket>();
  let isCut = false;
  const server = createServer((near) => {
    if (isCut) {
      near.resetAndDestroy();
      return;
    }
    const beyond = connect(far, '127.0.0.1');
    for (const socket of [near, beyond]) {
      open.add(socket);
      // one end that fails takes the other along, and that is all it may do
      socket.on('error', () => undefined);
      socket.once('close', () => {
        open.delete(socket);
        near.destroy();
        beyond.destroy();
      });
    }
    near.pipe(beyond).pipe(near);
  });
  server.listen(0, '127.0.0.1');
  await once(server, 'listening');
  const cut = () => {
    isCut = true;
    for (const socket of open) socket.resetAndDestroy();
  };
  return {
    port: (server.address() as AddressInfo).port,
    cut,
    mend: () => {
      isCut = false;
    },
    close: async () => {
      cut();
      server.close();
      await once(server, 'close');
    },
  };
};
