import {
  createContext,
  useCallback,
  useContext,
  useEffect,
  useEffectEvent,
  useMemo,
  useReducer,
  useState,
} from 'react';
import type { PublicEdition } from '#contract/editions';
import { type Player } from '../parts/player/create-player.ts';
import { lengthOf, lineAt, momentIn, momentOf } from './moments.ts';
import { stepAt, stepHash, stepsOf, type Step } from './steps.ts';
import { currentStep, keep, moveOn, openAt, readKept, type WatchDeed, type WatchState } from './watch-state.ts';

/** What every part of the page shares. */
export interface Watch {
  readonly edition: PublicEdition;
  readonly steps: readonly Step[];
  readonly state: WatchState;
  readonly step: Step;
  readonly player: Player;
  /** Number of the recording on the stage. */
  readonly recordingNumber: number;
  readonly act: (deed: WatchDeed) => void;
  /** Goes to a step and shows its moment, since somebody asked for it. */
  readonly show: (step: Step) => void;
  readonly before: Step | undefined;
  readonly next: Step | undefined;
}

export const WatchContext = createContext<Watch | null>(null);

/** @throws Error outside of the page's provider (a fault of ours) */
export function useWatch(): Watch {
  const watch = useContext(WatchContext);
  if (!watch) throw new Error('useWatch stands outside of the watch page');
  return watch;
}

/** Takes the player to a moment; another recording comes onto the stage where the moment is in one. */
function useStage(edition: PublicEdition, player: Player) {
  const first = edition.recordings.find(({ hasClip }) => hasClip) ?? edition.recordings[0];
  const [recordingNumber, setRecording] = useState(first?.number ?? 1);
  useEffect(() => player.setDuration(lengthOf(edition, recordingNumber)), [edition, player, recordingNumber]);
  const seek = useCallback(
    (toRecording: number, toMs: number) => {
      if (!edition.recordings.some(({ number }) => number === toRecording)) return;
      setRecording(toRecording);
      player.request({ kind: 'seek', toMs });
    },
    [edition, player],
  );
  return { recordingNumber, seek };
}

/** The whole page's state: place and ticks, kept in the browser; the stage; the address in the bar. */
export function useWatchPage(edition: PublicEdition, player: Player): Watch | null {
  const steps = useMemo(() => stepsOf(edition), [edition]);
  const [state, act] = useReducer(
    (now: WatchState, deed: WatchDeed) => moveOn(steps, now, deed),
    null,
    () => openAt(edition, readKept(edition, localStorage), location.hash),
  );
  const { recordingNumber, seek } = useStage(edition, player);
  const step = currentStep(steps, state);

  const show = useCallback(
    (to: Step) => {
      act({ kind: 'go', key: to.key });
      const moment = momentOf(edition, to.line);
      if (moment) seek(moment.recordingNumber, moment.startMs);
    },
    [edition, seek],
  );

  useEffect(() => keep(edition, state, localStorage), [edition, state]);

  // Where the page opens is decided once; what changes afterwards comes through the parts of the page.
  const open = useEffectEvent(() => {
    const named = momentIn(location.search);
    const opened = currentStep(steps, state);
    const moment = opened && momentOf(edition, opened.line);
    if (named) {
      seek(named.recordingNumber, named.ms);
      const line = lineAt(edition, named.recordingNumber, named.ms);
      const there = line && location.hash === '' ? steps.find((one) => one.line === line) : undefined;
      if (there) act({ kind: 'go', key: there.key });
    } else if (moment) seek(moment.recordingNumber, moment.startMs);
  });
  useEffect(() => open(), []);

  useEffect(() => {
    const follow = () => {
      const to = stepAt(steps, location.hash);
      if (to) show(to);
    };
    window.addEventListener('hashchange', follow);
    return () => window.removeEventListener('hashchange', follow);
  }, [steps, show]);

  const isFirst = step === steps[0];
  useEffect(() => {
    if (!step || (isFirst && location.hash === '')) return;
    history.replaceState(null, '', location.pathname + location.search + stepHash(step));
  }, [step, isFirst]);

  const index = step ? steps.indexOf(step) : -1;
  return useMemo(
    () =>
      step
        ? {
            ...{ edition, steps, state, step, player, recordingNumber, act, show },
            before: steps[index - 1],
            next: steps[index + 1],
          }
        : null,
    [edition, steps, state, step, player, recordingNumber, show, index],
  );
}
