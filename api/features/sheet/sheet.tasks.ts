import { z } from 'zod';
import type { Deps } from '../../platform/deps.ts';
import type { Tasks } from '../../platform/jobs.ts';
import { readEditionForJob } from '../editions/editions.service.ts';
import { SHEETS_JOB } from '../editions/publish.service.ts';
import { keepSheets } from './sheet-files.service.ts';

const Payload = z.object({ editionId: z.uuid() });

/** Makes the sheets of an edition that has just gone out. */
export function sheetTasks(deps: Deps): Tasks {
  return {
    [SHEETS_JOB]: async (payload) => {
      const { editionId } = Payload.parse(payload);
      const edition = await readEditionForJob(deps.db, editionId);
      if (edition) await keepSheets(deps, editionId, edition);
    },
  };
}
