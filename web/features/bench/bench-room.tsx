import { PanelRight } from 'lucide-react';
import { type ReactNode, useRef, useState } from 'react';
import { type Pattern } from '#contract/patterns';
import { cx } from '../../lib/class-names.ts';
import { NARROW, ONE_COLUMN, useMedia } from '../../lib/use-media.ts';
import { IconButton } from '../../ui/button.tsx';
import { useToast } from '../../ui/toast.tsx';
import { BenchPhone } from './bench-phone.tsx';
import { useCues } from './cues.queries.ts';
import { useBench } from './data/use-bench.ts';
import { Company, useTellSeat } from './desk/company.tsx';
import { KeysSheet } from './desk/keys-sheet.tsx';
import { Notices } from './desk/notices.tsx';
import { ProofButton } from './desk/proof-button.tsx';
import { KeysButton, SaveWords, TermsSwitch } from './desk/strip-controls.tsx';
import { useBenchKeys } from './desk/use-bench-keys.ts';
import { DeskProvider, useNewDesk } from './desk/use-desk.ts';
import { useRepair, useRepairing } from './desk/repairing.ts';
import { PatternPanel } from './pattern/pattern-panel.tsx';
import { Clip, ClipBar } from './side/clip-panel.tsx';
import { SidePanel } from './side/side-panel.tsx';
import { ThreadStrip } from './side/thread-strip.tsx';
import { TranscriptPanel } from './transcript/transcript-panel.tsx';

/** What the page's head is given: how saving stands, and what can be done. */
export interface BenchHead {
  readonly pattern: Pattern;
  readonly saving: ReactNode;
  readonly controls: ReactNode;
}

/** The room in which a pattern is made. The page draws its head around it. Give it the pattern's id as its key. */
export function BenchRoom({
  patternId,
  startLineId,
  head,
}: {
  patternId: string;
  startLineId: string | null;
  head: (parts: BenchHead) => ReactNode;
}) {
  const bench = useBench(patternId);
  const cues = useCues(bench.pattern.recordings);
  const desk = useNewDesk(bench, cues.byRecording, startLineId);
  useTellSeat(desk);
  const toast = useToast();
  const isPhone = useMedia(ONE_COLUMN);
  const isNarrow = useMedia(NARROW);
  const [hasKeys, setKeys] = useState(false);
  const [isFinding, setFinding] = useState(false);
  const [hasDrawer, setDrawer] = useState(false);
  const findField = useRef<HTMLInputElement>(null);
  const repair = useRepair(desk, desk.isOpen ? desk.lineId : null);
  const takeIt = useRepairing(desk);

  useBenchKeys(desk, {
    showKeys: () => setKeys(true),
    find: () => {
      setFinding(true);
      findField.current?.focus();
    },
    useSuggestion: () => repair && bench.pattern.mayEdit && takeIt(repair),
    tell: toast,
  });

  const controls = (
    <>
      <TermsSwitch />
      {isNarrow && !isPhone && (
        <IconButton
          icon={PanelRight}
          size={20}
          label="Ring map and shape"
          aria-expanded={hasDrawer}
          className="btn px-2!"
          onClick={() => setDrawer(!hasDrawer)}
        />
      )}
      <KeysButton onPress={() => setKeys(true)} />
      <ProofButton />
    </>
  );
  const saving = (
    <span className="flex items-center gap-2.5">
      <Company />
      <SaveWords />
    </span>
  );
  const transcript = <TranscriptPanel isFinding={isFinding} onFind={setFinding} field={findField} cues={cues} />;

  return (
    <DeskProvider value={desk}>
      <div className={cx('flex min-h-dvh grow flex-col', !isPhone && 'tall:h-dvh tall:overflow-hidden')}>
        {head({ pattern: bench.pattern, saving, controls })}
        <Notices />
        {isPhone ? (
          <BenchPhone transcript={transcript} />
        ) : (
          <main className="relative grid min-h-0 grow grid-cols-[minmax(240px,312px)_minmax(0,1fr)] lg:grid-cols-[312px_minmax(0,1fr)_316px]">
            <div className="flex min-h-0 flex-col max-lg:border-r max-lg:border-rule [&>section]:grow max-lg:[&>section]:border-r-0">
              {isNarrow && <ClipAndBar />}
              {transcript}
            </div>
            <PatternPanel />
            {!isNarrow && <SidePanel clip={<ClipAndBar />} />}
            {isNarrow && hasDrawer && (
              <div className="absolute inset-y-0 right-0 z-20 flex w-[316px] flex-col border-l border-edge bg-chalk">
                <SidePanel clip={null} />
              </div>
            )}
          </main>
        )}
        {!isPhone && <ThreadStrip />}
      </div>
      <KeysSheet isOpen={hasKeys} onClose={() => setKeys(false)} />
    </DeskProvider>
  );
}

const ClipAndBar = () => (
  <section aria-label="Clip">
    <Clip />
    <ClipBar />
  </section>
);
