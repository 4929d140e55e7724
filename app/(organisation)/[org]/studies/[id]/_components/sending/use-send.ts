'use client';

import { useState } from 'react';
import { ApiProblem } from '@/app/_components/api/api-problem';
import { callApi } from '@/app/_components/api/call-api';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import type { Grid, Study } from '@/lib/domain/studies/schema';
import { getUploadContract, type Upload } from '@/lib/domain/uploads/schema';
import { decideSend } from './decide-send';
import { fingerprintOf } from './fingerprint';
import type { Transfer } from './transfer';
import { isRemembered } from './upload-memory';
import type { Uploader } from './uploader';

/** A file that is not sent before somebody has answered. */
export interface Question { grid: string; file: File; fingerprint: string; why: 'being-sent' | 'other-file'; open: Upload }

interface SendOptions { study: Study; uploader: Uploader | null; transfers: ReadonlyMap<string, Transfer> }

/** The file that the grid has now and keeps until another is whole. */
const keptBy = (grid: Grid | undefined) => (grid?.upload && grid.state !== 'receiving' ? grid.upload.filename : null);

/** Sends files chosen for grids, or asks first where somebody else, or another file, is at it. */
export function useSend({ study, uploader, transfers }: SendOptions) {
  const { slug } = useOrganisation();
  const [questions, setQuestions] = useState<ReadonlyMap<string, Question>>(new Map());
  const [faults, setFaults] = useState<ReadonlyMap<string, string>>(new Map());

  const settle = (grid: string, question: Question | null, fault: string | null) => {
    setQuestions((before) => without(before, grid, question));
    setFaults((before) => without(before, grid, fault));
  };
  const openOf = async (grid: Grid | undefined): Promise<Upload | null> => {
    if (grid?.state !== 'receiving' || !grid.upload) return null;
    try {
      const upload = await callApi(getUploadContract, { organisation: slug, params: { id: grid.upload.id } });
      return upload.state === 'receiving' ? upload : null;
    } catch (error) {
      if (error instanceof ApiProblem && error.problem.status === 404) return null;
      throw error;
    }
  };
  const sendOne = async (label: string, file: File) => {
    settle(label, null, null);
    try {
      const grid = study.grids.find((each) => each.label === label);
      const fingerprint = await fingerprintOf(file);
      const open = await openOf(grid);
      const other = transfers.get(label);
      const decision = decideSend({
        file: { name: file.name, bytes: file.size, fingerprint }, open, isOurs: open !== null && isRemembered(open.id),
        elsewhere: other?.isElsewhere ? other : null, now: Date.now(),
      });
      if (decision.kind === 'ask') { settle(label, { grid: label, file, fingerprint, why: decision.why, open: decision.open }, null); return; }
      if (decision.kind === 'watch') { settle(label, null, 'Another tab is sending this file. This row shows how far it is.'); return; }
      uploader?.send({
        grid: label, file, fingerprint, keeps: keptBy(grid), resumes: decision.kind === 'resume' ? decision.upload : null,
        replaces: decision.kind === 'start' ? decision.replaces : null,
      });
    } catch (error) {
      settle(label, null, error instanceof Error && error.name === 'NotReadableError'
        ? `${file.name} cannot be read. Choose it again once it is written.` : 'The server did not answer, so nothing was sent. Choose the file again in a moment.');
    }
  };
  return {
    questions, faults,
    send: (files: readonly { file: File; grid: string }[]) => { for (const { file, grid } of files) void sendOne(grid, file); },
    replace: ({ grid, file, fingerprint, open }: Question) => {
      settle(grid, null, null);
      uploader?.send({ grid, file, fingerprint, keeps: null, resumes: null, replaces: open.id });
    },
    dismiss: (grid: string) => settle(grid, null, null),
  };
}

function without<T>(before: ReadonlyMap<string, T>, key: string, value: T | null): ReadonlyMap<string, T> {
  const after = new Map(before);
  if (value === null) after.delete(key);
  else after.set(key, value);
  return after;
}
