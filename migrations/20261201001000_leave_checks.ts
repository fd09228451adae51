import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    -- Findings of the automatic checks that somebody left as they are. What a check said then stands in says: one that
    -- says something else is open again.
    create table left_checks (
      id uuid primary key default gen_random_uuid(),
      pattern_id uuid not null references patterns on delete cascade,
      kind text not null,
      subject text not null default '',
      says text not null,
      reason text not null,
      deleted_at timestamptz,
      version integer not null default 1
    );
    create index left_checks_pattern_id on left_checks (pattern_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('drop table left_checks');
}
