import { beforeAll, describe, expect, it } from 'vitest';
import { wholeFields } from '@/lib/domain/assessment/whole-fields';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createCodeContract, createReleaseContract } from '@/lib/domain/codes/schema';
import { createProblemContract } from '@/lib/domain/problems/schema';
import { createStudyContract, getGridResultContract, type Study } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { signUp, type Person } from '@/tests/support/people';
import { readQuantityTable, readSolverFile, readSolverSet, readTriplets, type SetMeta } from '@/tests/support/solver-set';
import { awaitOutcome, putFile, sendParts } from '@/tests/support/study';

const norms = ['L1', 'L2', 'Linf'] as const;

let engineer: Person;
let code: string;

beforeAll(async () => {
  engineer = await signUp('Real Solvers');
  code = (await ok(engineer, createCodeContract, { body: { name: 'Several solvers' } })).slug;
  await ok(engineer, createReleaseContract, { params: { code }, body: { version: '1.0' } });
});

async function makeStudy({ id, title, dimension, domain, time, parameters, N_basis, fields, grids }: SetMeta): Promise<Study> {
  const problem = await ok(engineer, createProblemContract, {
    body: {
      name: title, equation: 'none', dimension, domain, unsteady: time !== null, constants: parameters,
      exact: Object.fromEntries(Object.entries(fields).map(([field, { exact }]) => [field, exact])),
    },
  });
  const made = await ok(engineer, createCaseContract, {
    body: {
      code, problem: problem.slug, name: id, kind: 'order', sampling: 'point',
      fields: Object.entries(fields).map(([field, { formal_order }]) => ({
        field, norms: norms.map((norm) => ({ norm, formalOrder: formal_order[norm] })),
      })),
    },
  });
  return ok(engineer, createStudyContract, {
    body: {
      case: made.slug, release: '1.0',
      grids: grids.map(({ n, rows, elements }) => ({
        label: `n${n}`, cells: N_basis === 'elements' ? elements : rows, ...(time === null ? {} : { t: time }),
      })),
    },
  });
}

describe.each([
  'A1_poisson_p1_node', 'C1_tgv_grid', 'D1_laplace_orthogonal', 'D2_laplace_nonorth_corrected', 'D3_laplace_nonorth_uncorrected', 'F1_plateau', 'F2_source_bug',
])('%s', (id) => {
  const { meta, expected } = readSolverSet(id);

  it('has the norms an independent script finds, and the outcomes its makers expect', async () => {
    const study = await makeStudy(meta);
    for (const [index, { n, file }] of meta.grids.entries()) {
      // Both ways into storage, turn about.
      const upload = index % 2 === 0 ? putFile : sendParts;
      await upload(engineer, { id: study.id, label: `n${n}` }, readSolverFile(id, file));
    }
    const { assessment, outcome } = await awaitOutcome(engineer, study.id);

    for (const [index, { n }] of meta.grids.entries()) {
      const wanted = expected.grids[index];
      const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: `n${n}` } });
      expect(result.rows).toBe(wanted?.N_rows);
      expect(Math.abs(result.weightSum - (wanted?.V ?? 0))).toBeLessThan(1e-9 * (wanted?.V ?? 0));
      for (const { field, exact, ...found } of result.fields) {
        const known = wanted?.fields[field];
        for (const norm of norms) expect(Math.abs(found[norm] / (known?.[norm] ?? 0) - 1)).toBeLessThan(1e-9);
        expect(Math.abs(exact.L2 / (known?.exact_L2 ?? 0) - 1)).toBeLessThan(1e-9);
      }
    }
    const judged = wholeFields(assessment.fields).map(({ field, norm, outcome: of, reasons }) => `${field} ${norm}: ${of} ${reasons.join()}`);
    const wanted = Object.entries(meta.fields).flatMap(([field, { expected_outcome }]) => norms.map((norm) => (
      `${field} ${norm}: ${expected_outcome[norm].outcome} ${expected_outcome[norm].reason}`)));
    expect(judged.sort()).toEqual(wanted.sort());
    expect(outcome).toBe(wanted.some((line) => line.includes(': fail')) ? 'fail' : 'pass');
    expect(assessment.inputs.map(({ label }) => label).sort()).toEqual(meta.grids.map(({ n }) => `n${n}`).sort());
  });
});

describe.each(['E1_plate_hole_cps4r', 'E2_plate_hole_cps4'])('%s', (id) => {
  const table = readQuantityTable(id);
  const names = ['peak_sxx', 'tip_ux', 'strain_energy'];
  const types: Record<string, string> = {
    'monotonic convergence': 'monotone', 'monotonic divergence': 'divergent',
    'oscillatory convergence': 'oscillatory', 'oscillatory divergence': 'oscillatory-divergent',
  };

  it('typed as quantities has the orders of its triplets', async () => {
    const problem = await ok(engineer, createProblemContract, { body: { name: `Plate ${id}`, equation: 'none', dimension: 2 } });
    const made = await ok(engineer, createCaseContract, {
      body: { code, problem: problem.slug, name: id, kind: 'solution', quantities: names.map((name) => ({ name, formalOrder: 2, target: 0.01 })) },
    });
    const study = await ok(engineer, createStudyContract, {
      body: {
        case: made.slug, release: '1.0',
        grids: table.map((row) => ({
          label: `g${row.grid}`, h: Number(row.h),
          values: Object.fromEntries(names.map((name) => [name, Number(row[name])])),
        })),
      },
    });
    expect(study.state).toBe('assessing');
    const { assessment } = await awaitOutcome(engineer, study.id);
    const triplets = readTriplets(id);
    for (const { name, triples } of assessment.quantities) {
      // Theirs run from the coarsest, ours from the finest; their order is positive by construction, ours is signed.
      const wanted = [...(triplets[name] ?? [])].reverse();
      expect(triples.map(({ convergence }) => convergence)).toEqual(wanted.map(({ convergence }) => types[convergence]));
      for (const [index, { convergence, p }] of wanted.entries()) {
        if (convergence === 'monotonic convergence') expect(triples[index]?.order).toBeCloseTo(p, 8);
      }
    }
    expect(assessment.quantities.map(({ name }) => name)).toEqual(names);
  });
});
