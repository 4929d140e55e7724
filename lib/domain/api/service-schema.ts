import { z } from 'zod';
import { contract } from './contract';

export const healthContract = contract({
  method: 'GET', path: '/health', summary: 'Alive', access: 'public', status: 200, response: z.strictObject({ alive: z.literal(true) }),
});
export const readyContract = contract({
  method: 'GET', path: '/ready', summary: 'Database, queue and storage are reachable; 503 names what is not', access: 'public', status: 200,
  response: z.strictObject({ database: z.literal(true), queue: z.literal(true), storage: z.literal(true) }),
});
export const openApiContract = contract({
  method: 'GET', path: '/openapi.json', summary: 'This document', access: 'public', status: 200, alsoAnswers: { 200: { description: 'OpenAPI 3.1' } },
});
export const metricsContract = contract({
  method: 'GET', path: '/metrics', summary: 'Numbers of this process and of the queue, as Prometheus text', access: 'public', status: 200,
  alsoAnswers: {
    200: { description: 'Text format 0.0.4', text: ['text/plain'] },
    404: { description: 'Asked from elsewhere without the token' },
  },
});
