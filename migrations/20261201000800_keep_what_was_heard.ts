import type { Knex } from 'knex';

/**
 * What was heard for a line stays for ever and is named by the line, so that undo brings back the words with the text.
 * A mark knows by whose words it was set, so that it can follow them into another transcript. The terms somebody speaks
 * in can be overruled.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    alter table line_evidence
      add column hearing_id uuid,
      add column words text not null default '',
      alter column reading_id drop not null;
    update line_evidence e set hearing_id = h.id
      from (select line_id, reading_id, gen_random_uuid() as id from line_evidence group by 1, 2) h
     where h.line_id = e.line_id and h.reading_id = e.reading_id;
    alter table line_evidence alter column hearing_id set not null;
    create index line_evidence_hearing_id on line_evidence (hearing_id);
    update line_evidence e set words = w.words
      from (select r.id, (x ->> 'firstWord')::int as first_word, (x ->> 'lastWord')::int as last_word,
                   min(x ->> 'words') as words
              from readings r, jsonb_path_query(r.draft, '$.pieces[*].lines[*].evidence[*]') as x
             group by 1, 2, 3) w
     where w.id = e.reading_id and w.first_word = e.first_word and w.last_word = e.last_word;

    alter table lines add column hearings uuid[] not null default '{}';
    update lines l set hearings = h.ids
      from (select line_id, array_agg(distinct hearing_id) as ids from line_evidence group by 1) h
     where h.line_id = l.id;

    alter table marks add column transcript_id uuid references transcripts on delete set null;
    create index marks_transcript_id on marks (transcript_id);
    update marks m set transcript_id = e.transcript_id
      from (select distinct on (e.line_id, t.recording_id) e.line_id, t.recording_id, e.transcript_id
              from line_evidence e join transcripts t on t.id = e.transcript_id
             order by e.line_id, t.recording_id, t.number desc) e
     where e.line_id = m.line_id and e.recording_id = m.recording_id;

    alter table recordings add column spoken_terms text check (spoken_terms in ('US', 'UK'));
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    alter table recordings drop column spoken_terms;
    alter table marks drop column transcript_id;
    delete from line_evidence e using lines l
     where l.id = e.line_id and (e.reading_id is null or not e.hearing_id = any(l.hearings));
    alter table lines drop column hearings;
    alter table line_evidence drop column hearing_id, drop column words, alter column reading_id set not null;
  `);
}
