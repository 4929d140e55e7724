import net from 'node:net';
import { Transform } from 'node:stream';
import { findFault, onFaults, untilOver } from './faults.mjs';

/** @typedef {{ client: import('./faults.mjs').Client, service: import('./faults.mjs').Service, port: number, target: number }} Door */

/** Bytes as they come, later where the network is slow. @param {Door} door */
function slowed({ client, service }) {
  return new Transform({
    transform(chunk, _encoding, done) {
      const delay = findFault(client, service, 'latency')?.delay ?? 0;
      if (delay === 0) done(null, chunk);
      else setTimeout(done, delay, null, chunk);
    },
  });
}

/** A connection to the target for every connection made to it, as long as the network is there. @param {Door} door */
export function openTcpDoor(door) {
  const { client, service, port, target } = door;
  const is = (/** @type {'lost' | 'cut'} */ kind) => findFault(client, service, kind) !== undefined;
  const server = net.createServer(async (near) => {
    near.on('error', () => near.destroy());
    if (is('cut')) return near.destroy();
    await untilOver(() => !is('lost'));
    const far = net.connect({ port: target, host: '127.0.0.1' });
    near.setNoDelay(true);
    far.setNoDelay(true);
    const [out, back] = [slowed(door), slowed(door)];
    let isJoined = false;
    const join = (/** @type {boolean} */ wanted) => {
      if (wanted === isJoined) return;
      isJoined = wanted;
      if (wanted) {
        near.pipe(out);
        far.pipe(back);
      } else {
        near.unpipe(out);
        far.unpipe(back);
      }
    };
    out.pipe(far);
    back.pipe(near);
    const end = () => {
      forget();
      near.destroy();
      far.destroy();
    };
    const forget = onFaults(() => (is('cut') ? end() : join(!is('lost'))));
    far.on('error', end);
    near.on('close', end);
    far.on('close', end);
    join(!is('lost'));
  });
  return new Promise((resolve) => server.listen(port, '127.0.0.1', () => resolve(undefined)));
}
