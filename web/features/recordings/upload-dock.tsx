import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '../../lib/paths.ts';
import { Winding } from '../../parts/thread/winding.tsx';
import { keepBenchOpen } from './upload/bench-open.ts';
import { hasEnded, progressOf } from './upload/upload-state.ts';
import { uploadWords } from './upload/upload-words.ts';
import { useUploads } from './upload/uploads.ts';

/**
 * What this tab is sending, shown on every page but the one where it can be seen anyway. It also tells the pages when
 * a clip has become whole, and the other tabs when a bench is open here.
 * @param at the address of the page that is open
 */
export function UploadDock({ at }: { at: string }) {
  const client = useQueryClient();
  const uploads = useUploads();
  const isBench = /^\/patterns\/[^/]+\/bench/.test(at);
  useEffect(() => (isBench ? keepBenchOpen() : undefined), [isBench]);

  const told = useRef(new Set<string>());
  useEffect(() => {
    for (const { patternId, recordingId, state } of uploads) {
      const key = `${recordingId} ${state.phase}`;
      if (!hasEnded(state) && state.phase !== 'finishing') told.current.delete(`${recordingId} ready`);
      if (!(hasEnded(state) || state.phase === 'paused') || told.current.has(key)) continue;
      told.current.add(key);
      void client.invalidateQueries({ queryKey: ['patterns', patternId] });
    }
  }, [uploads, client]);

  const shown = uploads.filter(
    ({ state, patternId }) =>
      state.phase !== 'ready' &&
      state.phase !== 'cancelled' &&
      !at.startsWith(paths.recording(patternId)) &&
      at !== paths.newPattern(),
  );
  if (shown.length === 0) return null;
  return (
    <aside
      aria-label="Clips on their way"
      className="fixed right-4 bottom-4 z-30 w-[320px] border border-edge bg-sheet max-sm:inset-x-3 max-sm:bottom-[70px] max-sm:w-auto"
    >
      {shown.map(({ recordingId, patternId, fileName, state }) => (
        <div key={recordingId} className="border-b border-feint px-3.5 py-2 last:border-b-0">
          <p className="flex items-baseline gap-3">
            <span className="min-w-0 truncate font-medium">{fileName}</span>
            <Link className="link ml-auto" to={paths.recording(patternId)}>
              Look
            </Link>
          </p>
          <Winding share={progressOf(state).share} width={290} label={`${fileName}, as far as it is up`} />
          <p className="small text-walnut2">{uploadWords(state)}</p>
        </div>
      ))}
    </aside>
  );
}
