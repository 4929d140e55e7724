import { need } from '../environment';
import type { Fault } from './faults.mjs';

/** Breaks the network of web or worker for a while, as told. */
export async function breakNetwork(fault: Fault): Promise<void> {
  await fetch(need('TEST_NETWORK_URL'), { method: 'POST', body: JSON.stringify(fault) });
}

/** Whole again at once. */
export async function mendNetwork(): Promise<void> {
  await fetch(need('TEST_NETWORK_URL'), { method: 'DELETE' });
}
