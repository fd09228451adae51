import type { Knex } from 'knex';
import type { Counted } from '#contract/pattern-input';

type ByPattern<T> = T & { readonly patternId: string };
export type ShelfPiece = ByPattern<Counted['pieces'][number]>;
export type ShelfLine = ByPattern<Counted['lines'][number] & { readonly isMarked: boolean }>;
export type ShelfSpecial = ByPattern<Counted['specialStitches'][number]>;

export interface ShelfContent {
  readonly pieces: ShelfPiece[];
  readonly lines: ShelfLine[];
  readonly specials: ShelfSpecial[];
  /** Number of the newest edition that was not withdrawn. */
  readonly editions: { patternId: string; number: number }[];
  /** Patterns with a recording, whose lines should have a moment. */
  readonly filmed: string[];
}

/** What the shelf counts of many patterns, in five queries however many they are. */
export async function readShelfContent(db: Knex, patternIds: readonly string[]): Promise<ShelfContent> {
  const pieces = await db('pieces')
    .whereIn('pattern_id', patternIds)
    .whereNull('deleted_at')
    .orderBy(['order_key', 'id'])
    .select<ShelfPiece[]>({ id: 'id', patternId: 'pattern_id', name: 'name', make: 'make', worked: 'worked' });
  const lines = await db('lines as l')
    .whereIn('l.pattern_id', patternIds)
    .whereNull('l.deleted_at')
    .orderBy(['l.order_key', 'l.id'])
    .select<ShelfLine[]>(
      {
        id: 'l.id',
        patternId: 'l.pattern_id',
        pieceId: 'l.piece_id',
        kind: 'l.kind',
        label: 'l.label',
        from: 'l.from_no',
        to: 'l.to_no',
        text: 'l.text',
        written: 'l.written',
        said: 'l.said',
      },
      db.raw('exists (select from marks m where m.line_id = l.id and m.deleted_at is null) as "isMarked"'),
    );
  const specials = await db('special_stitches')
    .whereIn('pattern_id', patternIds)
    .whereNull('deleted_at')
    .orderBy(['order_key', 'id'])
    .select<ShelfSpecial[]>('pattern_id as patternId', 'name', 'abbreviation', 'text');
  const editions = await db('editions')
    .whereIn('pattern_id', patternIds)
    .whereNull('withdrawn_at')
    .groupBy('pattern_id')
    .select<{ patternId: string; number: number }[]>({ patternId: 'pattern_id' }, db.raw('max(number) as number'));
  const filmed = await db('pattern_recordings')
    .whereIn('pattern_id', patternIds)
    .whereNull('removed_at')
    .distinct()
    .pluck<string[]>('pattern_id');
  return { pieces, lines, specials, editions, filmed };
}
