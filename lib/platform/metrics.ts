import { collectDefaultMetrics, Gauge, Registry } from 'prom-client';

interface PoolCounts { totalCount: number; idleCount: number; waitingCount: number }

/** Numbers of one process: memory, processor, and its connections to the database. */
export function createRegistry(process: 'web' | 'worker', pool: PoolCounts): Registry {
  const registry = new Registry();
  registry.setDefaultLabels({ process });
  collectDefaultMetrics({ register: registry });
  new Gauge({
    name: 'fourfold_database_connections', help: 'Connections of this process to the database; waiting counts what wants one.', labelNames: ['state'],
    registers: [registry],
    collect() {
      this.set({ state: 'open' }, pool.totalCount);
      this.set({ state: 'idle' }, pool.idleCount);
      this.set({ state: 'waiting' }, pool.waitingCount);
    },
  });
  return registry;
}
