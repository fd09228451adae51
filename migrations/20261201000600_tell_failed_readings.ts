import type { Knex } from 'knex';

/** A transcript waits to be read until it has a reading; one that could not be read says so, and can be read again. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw('alter table transcripts add column reading_failed_at timestamptz');
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('alter table transcripts drop column reading_failed_at');
}
