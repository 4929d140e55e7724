import http from 'node:http';
import { describe, expect, it } from 'vitest';
import { need } from '../support/environment';

const body = JSON.stringify({ grids: [{ h: 0.25, value: 1.3 }, { h: 0.5, value: 1.2 }, { h: 1, value: 0.8 }] });
// Another loopback address, so that the allowance of the other tests stays whole.
const agent = new http.Agent({ keepAlive: true, maxSockets: 4, localAddress: '127.0.0.2' });

interface Answer { status: number; retryAfter: string | undefined; type: string | undefined }

function assess(call: number): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const request = http.request(new URL('/api/v1/assess', need('WEB_URL')), {
      agent, method: 'POST', headers: { 'content-type': 'application/json', 'x-forwarded-for': `10.0.${call >> 8}.${call & 255}` },
    }, (response) => {
      response.resume();
      response.on('end', () => resolve({
        status: response.statusCode ?? 0, retryAfter: response.headers['retry-after'], type: response.headers['content-type'],
      }));
    });
    request.on('error', reject);
    request.end(body);
  });
}

describe('POST /api/v1/assess, many times', () => {
  it('answers 600 calls of one address in a minute, then 429 with Retry-After, whatever X-Forwarded-For says', async () => {
    const answers: Answer[] = [];
    const begun = Date.now();
    while (answers.length < 620) answers.push(...await Promise.all([0, 1, 2, 3].map((step) => assess(answers.length + step))));
    agent.destroy();
    expect(Date.now() - begun).toBeLessThan(55_000);
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(600);
    const refused = answers.filter(({ status }) => status === 429);
    expect(refused).toHaveLength(20);
    expect(refused.every(({ retryAfter, type }) => Number(retryAfter) > 0 && type === 'application/problem+json')).toBe(true);
  });
});
