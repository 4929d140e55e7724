import fs from 'node:fs';
import path from 'node:path';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createCodeContract, createReleaseContract } from '@/lib/domain/codes/schema';
import { createProblemContract } from '@/lib/domain/problems/schema';
import { createStudyContract, type Study } from '@/lib/domain/studies/schema';
import { ok } from './api';
import type { DroppedFile } from './drop-files';
import type { Person } from './people';
import { readSolverSet } from './solver-set';

const folder = path.join(import.meta.dirname, '../../fixtures/solver-output');

/** The files of a series as they lie there, packed or not. */
export function solverFiles(id: string): DroppedFile[] {
  return readSolverSet(id).meta.grids.map(({ file }) => {
    const name = fs.existsSync(path.join(folder, id, file)) ? file : `${file}.gz`;
    return { name, bytes: fs.readFileSync(path.join(folder, id, name)) };
  });
}

export function brokenFile(name: string): DroppedFile {
  return { name, bytes: fs.readFileSync(path.join(folder, 'broken', name)) };
}

export interface SolverStudy { study: Study; again: () => Promise<Study> }

/**
 * A study without data for a series of one field, on a case that calls the field as given; `again` makes another study of
 * that case on the next release.
 */
export async function makeSolverStudy(person: Person, id: string, called?: string): Promise<SolverStudy> {
  const { meta } = readSolverSet(id);
  const [[own, { exact, formal_order: formal }] = ['', { exact: '0', formal_order: { L1: 1, L2: 1, Linf: 1 } }]] = Object.entries(meta.fields);
  const field = called ?? own;
  const norms = (['L1', 'L2', 'Linf'] as const).map((norm) => ({ norm, formalOrder: formal[norm] }));
  const code = await ok(person, createCodeContract, { body: { name: 'Brack' } });
  const problem = await ok(person, createProblemContract, {
    body: { name: 'Harmonic field', equation: 'poisson', dimension: meta.dimension, constants: meta.parameters, exact: { [field]: exact }, domain: meta.domain },
  });
  const gridPlan = meta.grids.map(({ n, rows, elements }) => ({ label: `n${n}`, cells: meta.N_basis === 'elements' ? (elements ?? rows) : rows }));
  const made = await ok(person, createCaseContract, {
    body: { code: code.slug, problem: problem.slug, name: meta.title, kind: 'order', sampling: 'point', fields: [{ field, norms }], gridPlan },
  });
  const start = async (release: string) => {
    await ok(person, createReleaseContract, { params: { code: code.slug }, body: { version: release } });
    return ok(person, createStudyContract, { body: { case: made.slug, release, grids: gridPlan } });
  };
  return { study: await start('1.0.0'), again: () => start('1.1.0') };
}
