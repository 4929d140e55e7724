import { describe, expect, it } from 'vitest';
import supertest from 'supertest';
import { healthContract, readyContract } from '@/lib/domain/api/service-schema';
import { ok } from '../support/api';
import { need } from '../support/environment';

describe('GET /api/v1/health', () => {
  it('answers while the process lives', async () => expect(await ok(null, healthContract, {})).toEqual({ alive: true }));
});

describe('GET /api/v1/ready', () => {
  it('answers once database, queue and storage are reachable', async () => {
    expect(await ok(null, readyContract, {})).toEqual({ database: true, queue: true, storage: true });
  });
});

describe('a path that is no call', () => {
  it.each(['get', 'post', 'put', 'patch', 'delete'] as const)('answers 404 as a problem to %s', async (method) => {
    const response = await supertest(need('WEB_URL'))[method]('/api/v1/schemes/derive');
    expect(response.status).toBe(404);
    expect(response.type).toBe('application/problem+json');
    expect(response.body).toMatchObject({ status: 404, errors: [] });
  });

  it('answers 404 at the root too', async () => {
    expect((await supertest(need('WEB_URL')).get('/api/v1')).status).toBe(404);
  });
});
