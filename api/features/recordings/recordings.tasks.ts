import type { Deps } from '../../platform/deps.ts';
import type { Tasks } from '../../platform/jobs.ts';
import { finishClip } from './clip-finish.service.ts';
import { readTranscriptJob } from './readings.service.ts';
import { clearDoomedObject, sweepStorage } from './sweep.service.ts';

/** What is done with recordings in the background, by name. */
export function recordingTasks(deps: Deps): Tasks {
  return {
    'finish-clip': (payload) => finishClip(deps, payload),
    'clear-object': (payload) => clearDoomedObject(deps, payload),
    'read-transcript': (payload, info) => readTranscriptJob(deps, payload, info),
    'sweep-storage': async () => {
      await sweepStorage(deps);
    },
  };
}
