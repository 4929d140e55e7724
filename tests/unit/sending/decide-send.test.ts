import { describe, expect, it } from 'vitest';
import { decideSend } from '@/app/(organisation)/[org]/studies/[id]/_components/sending/decide-send';
import type { Upload } from '@/lib/domain/uploads/schema';

const now = Date.parse('2026-12-01T12:00:00Z');
const file = { name: 'n64.csv', bytes: 1000, fingerprint: 'a' };
const openedBefore = (seconds: number, changes: Partial<Upload> = {}): Upload => ({
  id: 'u1', study: 's', grid: 'n64', filename: 'n64.csv', bytes: 1000, sha256: null, state: 'receiving', partSize: 500, parts: [], rowsRead: null, reasons: [],
  fingerprint: 'a', createdBy: 'other@northmoor.example', createdAt: '2026-12-01T11:00:00.000Z', lastActivityAt: new Date(now - seconds * 1000).toISOString(), ...changes,
});
const decide = (changes: Partial<Parameters<typeof decideSend>[0]>) => decideSend({ file, open: null, isOurs: false, elsewhere: null, now, ...changes });

describe('a file chosen for a grid', () => {
  it('is sent where nothing is open, and says that it expects nothing', () => {
    expect(decide({})).toEqual({ kind: 'start', replaces: null });
  });
  it('goes on where the same file was half sent: at once in the browser that began it, elsewhere once it is quiet', () => {
    for (const [seconds, isOurs] of [[1, true], [61, true], [61, false]] as const) {
      const open = openedBefore(seconds);
      expect(decide({ open, isOurs })).toEqual({ kind: 'resume', upload: open });
    }
  });
  it('waits for an answer where somebody is sending, whatever the file', () => {
    for (const fingerprint of ['a', 'b']) {
      expect(decide({ file: { ...file, fingerprint }, open: openedBefore(59) })).toMatchObject({ kind: 'ask', why: 'being-sent' });
    }
  });
  it.each([['content', { fingerprint: 'b' }], ['size', { bytes: 1001 }], ['name', { name: 'n64-new.csv' }]])('of another %s than the half sent one waits for an answer', (_what, other) => {
    for (const isOurs of [true, false]) expect(decide({ file: { ...file, ...other }, open: openedBefore(3600), isOurs })).toMatchObject({ kind: 'ask', why: 'other-file' });
  });
  it('is not sent twice: another tab that sends it is watched', () => {
    expect(decide({ open: openedBefore(1), isOurs: true, elsewhere: { fingerprint: 'a' } })).toEqual({ kind: 'watch' });
    expect(decide({ elsewhere: { fingerprint: 'a' } })).toEqual({ kind: 'watch' });
    expect(decide({ open: openedBefore(1), isOurs: true, elsewhere: { fingerprint: 'b' } })).toMatchObject({ kind: 'ask', why: 'being-sent' });
  });
});
