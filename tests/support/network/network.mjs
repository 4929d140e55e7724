import http from 'node:http';
import { addFault, clearFaults } from './faults.mjs';
import { openStorageDoor } from './storage-door.mjs';
import { openTcpDoor } from './tcp-door.mjs';

/**
 * The network between the product of a test run and its services. As long as no test says otherwise it lets everything
 * through. Control: GET / answers, POST / with a fault as JSON adds it, DELETE / ends them all.
 */
const { doors, services } = JSON.parse(process.argv[2] ?? '{}');

for (const client of /** @type {const} */ (['web', 'worker'])) {
  for (const service of /** @type {const} */ (['postgres', 'redis', 'smtp'])) {
    await openTcpDoor({ client, service, port: doors[client][service], target: services[service] });
  }
  await openStorageDoor({ client, service: 'storage', port: doors[client].storage, target: services.storage });
}

const control = http.createServer(async (request, answer) => {
  let text = '';
  for await (const chunk of request) text += chunk;
  if (request.method === 'POST') addFault(JSON.parse(text));
  if (request.method === 'DELETE') clearFaults();
  answer.end();
});
control.listen(doors.control, '127.0.0.1');
