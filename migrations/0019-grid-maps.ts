import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    -- They go with the result that they were read with.
    create table grid_maps (
      organisation_id uuid not null,
      grid_id uuid not null,
      field text not null,
      plane text not null constraint grid_maps_plane_check check (plane in ('x', 'xy', 'xz', 'yz')),
      width integer not null,
      height integer not null,
      bounds jsonb not null,
      largest double precision not null,
      -- Shares of the largest in single precision, the least byte first; not a number where no row lies.
      shares bytea not null,
      constraint grid_maps_pkey primary key (organisation_id, grid_id, field, plane),
      constraint grid_maps_result_fkey foreign key (organisation_id, grid_id) references grid_results (organisation_id, grid_id) on delete cascade,
      constraint grid_maps_size_check check (width between 1 and 256 and height between 1 and 256 and length(shares) = 4 * width * height)
    );

    alter table grid_maps enable row level security;
    alter table grid_maps force row level security;
    create policy grid_maps_tenant on grid_maps to fourfold_app
      using (organisation_id = current_organisation()) with check (organisation_id = current_organisation());
    create policy grid_maps_maintenance on grid_maps for select to fourfold_maintenance using (true);
    grant select, insert, update, delete on grid_maps to fourfold_app;
    grant select on grid_maps to fourfold_maintenance;
  `.execute(db);
}
