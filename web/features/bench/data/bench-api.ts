import { z } from 'zod';
import { Undone } from '#contract/changes';
import { Pattern } from '#contract/patterns';
import { send } from '../../../lib/http.ts';
import type { Fields, Kind, RowKind } from './bench-types.ts';
import type { Pending } from './pending.ts';
import type { AnyRow } from './row-lists.ts';

/** What the bench asks of the server. */
export interface BenchApi {
  read(): Promise<Pattern>;
  /** Sends one change. @returns the saved row; null for one that was taken away */
  write(entry: Pending): Promise<AnyRow | null>;
  undo(which: 'undo' | 'redo'): Promise<Undone>;
}

const PATHS: Readonly<Record<RowKind, string>> = {
  piece: 'pieces',
  line: 'lines',
  mark: 'marks',
  material: 'materials',
  caution: 'cautions',
  note: 'notes',
  'special-stitch': 'special-stitches',
  'left-check': 'left-checks',
};

// The server has parsed its answer by the contract; here only what every row has is looked at.
const AnyRowAnswer = z.looseObject({ id: z.uuid(), version: z.int() });
const Nothing = z.undefined();

const urlOf = (patternId: string, kind: Kind, id: string) =>
  kind === 'pattern' ? `/api/patterns/${patternId}` : `/api/${PATHS[kind]}/${id}`;

export const readPattern = (patternId: string, signal?: AbortSignal): Promise<Pattern> =>
  send(Pattern, `/api/patterns/${patternId}`, signal && { signal });

export function benchApi(patternId: string): BenchApi {
  return {
    read: () => readPattern(patternId),
    async write({ op, kind, id, fields, baseVersion, deedId }) {
      const headers = { 'Deed-Id': deedId };
      if (op === 'create') {
        const url = `/api/patterns/${patternId}/${PATHS[kind as RowKind]}`;
        return send(AnyRowAnswer, url, { method: 'POST', headers, body: { ...fields, id } });
      }
      const version = baseVersion ?? 1;
      const url = urlOf(patternId, kind, id);
      if (op === 'edit')
        return send(AnyRowAnswer, url, { method: 'PATCH', headers, version, body: fields satisfies Fields });
      await send(Nothing, url, { method: 'DELETE', headers, version });
      return null;
    },
    undo: (which) => send(Undone, `/api/patterns/${patternId}/${which}`, { method: 'POST', body: {} }),
  };
}
