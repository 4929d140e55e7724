'use client';

import { useMemo, useState } from 'react';
import { Answered } from '@/app/_components/api/answered';
import { useApi } from '@/app/_components/api/use-api';
import { ErrorMap } from '@/app/_components/figures/error-map/error-map';
import { toRaster } from '@/app/_components/figures/error-map/map-raster';
import { FieldSwitch } from '@/app/_components/figures/field-switch';
import { SelectField } from '@/app/_components/forms/select-field';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { getGridMapContract, type GridMapBins } from '@/lib/domain/studies/map-schema';
import { getGridResultContract, type GridResult, type Study } from '@/lib/domain/studies/schema';

interface ErrorMapsProps { study: Study; number: number }

const planeWords = { x: 'along x', xy: 'x and y', xz: 'x and z', yz: 'y and z' } as const;

/** Where the errors are on a grid that was read from a file; the finest first. */
export function ErrorMaps({ study, number }: ErrorMapsProps) {
  const { slug } = useOrganisation();
  const grids = study.grids.filter(({ state, upload }) => state === 'read' && upload);
  const [label, setLabel] = useState<string | null>(null);
  const shown = grids.find((grid) => grid.label === label) ?? grids[0];
  const result = useApi(
    getGridResultContract, { organisation: slug, params: { id: study.id, label: shown?.label ?? '' }, query: { revision: study.revision } }, { enabled: Boolean(shown), keepsAnswer: true },
  );
  if (!shown) return <p className="text-graphite">No map of the errors: the values of all grids were typed.</p>;
  return (
    <Answered query={result}>
      {(found) => <GridMaps study={study} number={number} result={found} labels={grids.map((grid) => grid.label)} label={shown.label} onLabel={setLabel} />}
    </Answered>
  );
}

interface GridMapsProps extends ErrorMapsProps { result: GridResult; labels: readonly string[]; label: string; onLabel: (label: string) => void }

function GridMaps({ study, number, result, labels, label, onLabel }: GridMapsProps) {
  const { slug } = useOrganisation();
  const [field, setField] = useState<string | null>(null);
  const [plane, setPlane] = useState<GridMapBins['plane'] | null>(null);
  const fields = [...new Set(result.maps.map((map) => map.field))];
  const shownField = fields.find((each) => each === field) ?? fields[0];
  const planes = result.maps.flatMap((map) => (map.field === shownField ? [map.plane] : []));
  const shownPlane = planes.find((each) => each === plane) ?? planes[0];
  const map = useApi(
    getGridMapContract,
    { organisation: slug, params: { id: study.id, label, field: shownField ?? '' }, query: { plane: shownPlane, revision: study.revision } },
    { enabled: shownField !== undefined && result.label === label, keepsAnswer: true },
  );
  return (
    <>
      <div className="screen-only mb-3 flex flex-wrap items-end gap-x-6 gap-y-2">
        {fields.length > 1 && <FieldSwitch fields={fields} shown={shownField ?? ''} onShow={setField} onlyNarrow={false} />}
        {labels.length > 1 && (
          <SelectField label="Grid" value={label} onChange={({ target }) => onLabel(target.value)} className="mb-3 w-44">
            {labels.map((each) => <option key={each} value={each}>{each}</option>)}
          </SelectField>
        )}
        {planes.length > 1 && (
          <SelectField label="Plane" value={shownPlane} onChange={({ target }) => setPlane(planes.find((each) => each === target.value) ?? null)} className="mb-3 w-44">
            {planes.map((each) => <option key={each} value={each}>{planeWords[each]}</option>)}
          </SelectField>
        )}
      </div>
      {shownField === undefined
        ? <p className="text-graphite">Grid {label} has no map: it was read before maps were kept. Upload its file in a new revision to have one.</p>
        : <Answered query={map}>{(bins) => <ShownMap map={bins} result={result} study={study} number={number} />}</Answered>}
    </>
  );
}

function ShownMap({ map, result, study, number }: { map: GridMapBins; result: GridResult; study: Study; number: number }) {
  const { dimension } = study.problemDefinition;
  const raster = useMemo(() => toRaster(map, dimension), [map, dimension]);
  // While another grid is on its way the map before stays, and the place of another grid's error is none of it.
  const at = result.label === map.label ? result.fields.find(({ field }) => field === map.field)?.at : undefined;
  return <ErrorMap key={`${map.label} ${map.field} ${map.plane}`} number={number} raster={raster} field={map.field} grid={map.label} largest={map.largest} at={at ?? nowhere} />;
}

const nowhere = {};
