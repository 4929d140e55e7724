/** @typedef {'web' | 'worker'} Client */
/** @typedef {'postgres' | 'redis' | 'storage' | 'smtp'} Service */
/** @typedef {{ client: Client | null, service: Service | null, kind: 'lost' | 'cut' | 'latency' | 'error' | 'stall' | 'truncate',
 *   milliseconds: number, status?: number, delay?: number }} Fault what is null is meant to be all of them */

/** @type {Set<Fault>} */
const present = new Set();
/** @type {Set<() => void>} */
const listeners = new Set();

const tell = () => listeners.forEach((listener) => listener());

/** @param {Fault} fault ends by itself after its time */
export function addFault(fault) {
  present.add(fault);
  tell();
  setTimeout(() => {
    if (present.delete(fault)) tell();
  }, fault.milliseconds);
}

export function clearFaults() {
  present.clear();
  tell();
}

/** @param {Client} client @param {Service} service @param {Fault['kind']} kind @returns {Fault | undefined} */
export function findFault(client, service, kind) {
  return [...present].find((fault) => fault.kind === kind && (fault.client ?? client) === client && (fault.service ?? service) === service);
}

/** Calls back at every change; the function returned ends it. @param {() => void} listener */
export function onFaults(listener) {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** @param {() => boolean} isOver @returns {Promise<void>} */
export function untilOver(isOver) {
  if (isOver()) return Promise.resolve();
  return new Promise((resolve) => {
    const end = onFaults(() => {
      if (!isOver()) return;
      end();
      resolve();
    });
  });
}
