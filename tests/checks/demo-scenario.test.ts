import { Readable } from 'node:stream';
import { describe, expect, it } from 'vitest';
import { scenarios } from '@/fixtures/demo/scenario';
import type { ScenarioCase, ScenarioStudy } from '@/fixtures/demo/scenario-types';
import { checkCase } from '@/lib/domain/cases/check-case';
import { matchColumns } from '@/lib/domain/columns/match-columns';
import { createCaseSchema } from '@/lib/domain/cases/schema';
import { checkProblem } from '@/lib/domain/problems/check-problem';
import { createProblemSchema } from '@/lib/domain/problems/schema';
import { builtInRule } from '@/lib/domain/rules/built-in-rule';
import { assessSeries } from '@/lib/numerics/assess-series';
import type { ErrorSeries, QuantitySeries, SeriesAssessment } from '@/lib/numerics/assessment';
import type { GridNorms } from '@/lib/numerics/norms/grid-norms';
import { readGrid } from '@/lib/readers/read-grid';

interface Read { label: string; h: number; norms: GridNorms | null; values: Record<string, number> }

async function readStudy(theCase: ScenarioCase, study: ScenarioStudy, problem: ReturnType<typeof createProblemSchema.parse>): Promise<Read[]> {
  const definition = createCaseSchema.parse({ code: 'brack', ...theCase.definition });
  const fields = definition.fields.map(({ field }) => field);
  return Promise.all(study.grids.map(async (grid) => {
    const { label, cells, cellsPerDirection } = grid;
    const h = 1 / Number(cells ?? cellsPerDirection);
    if ('runToValues' in grid) return { label, h, norms: null, values: grid.runToValues() };
    const file = grid.runToFile();
    const header = file.slice(0, file.indexOf('\n')).split(',');
    const mapping = definition.columns ?? matchColumns(header, { dimension: problem.dimension, fields }).mapping;
    if (mapping === null) throw new Error(`${definition.slug}: the columns ${header.join(', ')} do not map themselves`);
    const columns = Object.fromEntries(Object.entries(mapping.fields).map(([name, column]) => [name, String(column)]));
    const reading = { mapping: { ...mapping, fields: columns }, problem: { dimension: problem.dimension, exact: problem.exact ?? {}, constants: problem.constants }, fields: definition.fields };
    const { norms } = await readGrid(Readable.from([Buffer.from(file)]), reading);
    return { label, h, norms, values: {} };
  }));
}

function assess(theCase: ScenarioCase, grids: readonly Read[]): SeriesAssessment {
  const definition = createCaseSchema.parse({ code: 'brack', ...theCase.definition });
  const minimumGrids = definition.minimumGrids ?? builtInRule.minimumGrids;
  const errors = definition.fields.flatMap(({ field, norms }) => norms.map((declared): ErrorSeries => {
    const norm = declared.norm === 'L1' || declared.norm === 'L2' ? declared.norm : 'Linf';
    const found = grids.map(({ label, h, norms: gathered }) => {
      const own = gathered?.fields.find((each) => each.field === field);
      if (!own) throw new Error(`${definition.slug}: grid ${label} has no norms of ${field}`);
      return { label, h, error: own[norm], knownError: 0, exactNorm: own.exact[norm], at: own.at, largest: own.exact.Linf };
    });
    return {
      field, norm, grids: found, formalOrder: declared.formalOrder ?? null, derivedOrder: null, tolerance: declared.tolerance ?? null,
      counts: declared.counts, expectExact: declared.expectExact, exactLimit: null, scale: Math.max(...found.map(({ largest }) => largest)),
      precision: 'double', minimumGrids, samplingStated: true,
    };
  }));
  const quantities = definition.quantities.map(({ name, formalOrder, target }): QuantitySeries => ({
    name, unit: null, formalOrder: formalOrder ?? null, target: target ?? null, minimumGrids, procedure: 'three-grid', uNumFactor: null,
    grids: grids.map(({ label, h, values }) => ({ label, h, value: values[name] ?? Number.NaN, resolution: null })),
  }));
  return assessSeries({ errors, quantities });
}

const studies = scenarios.flatMap((scenario) => scenario.cases.flatMap((theCase) => theCase.studies.map((study) => {
  const problem = createProblemSchema.parse(scenario.problems.find(({ slug }) => slug === theCase.definition.problem));
  return { title: `${theCase.definition.slug} on ${scenario.code.slug} ${study.release}`, theCase, study, problem };
})));

describe('the demo: what the solvers wrote comes out as the scenario says', () => {
  it.each(studies)('$title is $study.expected.outcome', { timeout: 30_000 }, async ({ theCase, study, problem }) => {
    const { outcome, reasons } = assess(theCase, await readStudy(theCase, study, problem));
    expect({ outcome, reasons }).toEqual(study.expected);
  });

  it.each(studies)('$title stands on a problem and a case the product takes', ({ theCase, problem }) => {
    const definition = createCaseSchema.parse({ code: 'brack', ...theCase.definition });
    expect([...checkProblem(problem), ...checkCase(definition, problem, definition.kind)]).toEqual([]);
  });

  it('has passing, failing and inconclusive studies, and a case that got worse', () => {
    const [northmoor] = scenarios;
    const latest = northmoor?.cases.map(({ studies: all }) => all.map(({ expected }) => expected.outcome)) ?? [];
    const count = (wanted: string) => latest.filter((outcomes) => outcomes.at(-1) === wanted).length;
    expect(latest).toHaveLength(6);
    expect(latest.every((outcomes) => outcomes.length === 2)).toBe(true);
    expect([count('pass'), count('fail'), count('inconclusive'), count('meets-target')]).toEqual([2, 2, 1, 1]);
    expect(latest.some(([before, after]) => before === 'pass' && after === 'fail')).toBe(true);
  });
});
