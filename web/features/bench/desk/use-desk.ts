import { createContext, use, useEffect, useMemo, useState } from 'react';
import { type Pattern } from '#contract/patterns';
import { type Cue } from '#contract/recordings';
import { type Line, type Mark } from '#contract/rows';
import { type Player } from '../../../parts/player/create-player.ts';
import { useNewPlayer } from '../../../parts/player/use-player.ts';
import { useToast } from '../../../ui/toast.tsx';
import { type PatternChecks, useChecks } from '../checks/use-checks.ts';
import { type Bench } from '../data/bench-types.ts';
import { type Caption, readCaptions, sensesOf, type WordSense } from '../transcript/captions.ts';
import { type ChosenWords } from '../transcript/choose-words.ts';
import { type Counts } from './bench-count.ts';
import { mainMark, momentsOf } from './moments.ts';

/** What lies on the desk: the bench with its deeds, which line and recording are in hand, and the player. */
export interface Desk {
  readonly bench: Bench;
  readonly pattern: Pattern;
  readonly counts: Counts;
  readonly player: Player;
  /** The line the hand is on; `isOpen` when it can be written in. */
  readonly lineId: string | null;
  readonly isOpen: boolean;
  readonly pick: (lineId: string | null, open?: boolean) => void;
  readonly recordingId: string | null;
  readonly showRecording: (recordingId: string) => void;
  readonly captions: readonly Caption[];
  /** The same as they came, for the library. */
  readonly cues: readonly Cue[];
  /** Words of the shown transcript that somebody chose. */
  readonly chosenWords: ChosenWords | null;
  readonly chooseWords: (words: ChosenWords | null) => void;
  readonly senses: ReadonlyMap<number, WordSense>;
  /** Main moments in the shown recording, in order of time. */
  readonly moments: readonly Mark[];
  /** How long the shown recording is, as far as clip, transcript and marks tell. */
  readonly lastMs: number;
  /** Puts the playhead on the line's moment, in whichever recording it is. */
  readonly goTo: (lineId: string) => void;
  readonly checks: PatternChecks;
  /** Whether the list of checks is shown. */
  readonly isChecking: boolean;
  readonly showChecks: (isShown: boolean) => void;
  /** Says what was done, with its Undo. */
  readonly tellDone: (words: string) => void;
}

const DeskContext = createContext<Desk | null>(null);
export const DeskProvider = DeskContext.Provider;

/** The desk around this component. */
export function useDesk(): Desk {
  const desk = use(DeskContext);
  if (!desk) throw new Error('useDesk belongs inside the bench.');
  return desk;
}

const NO_CUES: readonly Cue[] = [];

/** Captions by recording id. */
export type CuesByRecording = Readonly<Record<string, readonly Cue[]>>;

/** Sets the desk out; `startLineId` lies open from the start (a line's address leads to it). */
export function useNewDesk(bench: Bench, cuesByRecording: CuesByRecording, startLineId: string | null): Desk {
  const { pattern } = bench;
  const toast = useToast();
  const [inHand, setInHand] = useState({ lineId: startLineId, isOpen: startLineId !== null });
  const lineId = pattern.lines.some((line) => line.id === inHand.lineId) ? inHand.lineId : null;

  const [chosen, showRecording] = useState<string | null>(null);
  const recording = pattern.recordings.find((one) => one.id === chosen) ?? pattern.recordings[0];
  const recordingId = recording?.id ?? null;
  const transcriptId = recording?.transcriptId;

  const cues = recordingId ? cuesByRecording[recordingId] : undefined;
  const [chosenWords, setChosenWords] = useState<(ChosenWords & { of: string | null }) | null>(null);
  const captions = useMemo(() => readCaptions(cues ?? []), [cues]);
  const senses = useMemo(
    () => sensesOf(pattern.evidence.filter((one) => one.transcriptId === transcriptId)),
    [pattern.evidence, transcriptId],
  );
  const moments = useMemo(() => momentsOf(pattern.marks, recordingId), [pattern.marks, recordingId]);

  const checks = useChecks(bench);
  const [isChecking, showChecks] = useState(false);

  const player = useNewPlayer();
  const lastMs = Math.max(recording?.durationMs ?? 0, captions.at(-1)?.endMs ?? 0, moments.at(-1)?.startMs ?? 0);
  useEffect(() => player.setDuration(lastMs), [player, lastMs]);
  const [startMs] = useState(() => (startLineId ? mainMark(pattern.marks, startLineId)?.startMs : undefined));
  useEffect(() => {
    if (startMs !== undefined) player.request({ kind: 'seek', toMs: startMs });
  }, [player, startMs]);

  return {
    bench,
    pattern,
    counts: bench.lineCounts,
    player,
    lineId,
    isOpen: inHand.isOpen && lineId !== null,
    pick: (id, open = false) => setInHand({ lineId: id, isOpen: open && id !== null }),
    recordingId,
    showRecording,
    captions,
    cues: cues ?? NO_CUES,
    // Another recording has other words under the same numbers.
    chosenWords: chosenWords?.of === recordingId ? chosenWords : null,
    chooseWords: (words) => setChosenWords(words && { ...words, of: recordingId }),
    senses,
    moments,
    lastMs,
    checks,
    isChecking,
    showChecks,
    goTo: (id) => {
      const mark = mainMark(pattern.marks, id);
      if (!mark) return;
      showRecording(mark.recordingId);
      player.request({ kind: 'seek', toMs: mark.startMs });
    },
    tellDone: (words) =>
      toast(words, () => void bench.undo().then((outcome) => toast(outcome.done ? 'Undone' : outcome.words))),
  };
}

/** A line by its id. */
export const lineOf = (desk: Pick<Desk, 'pattern'>, lineId: string | null): Line | undefined =>
  desk.pattern.lines.find((line) => line.id === lineId);
