import { type ReactNode, useState } from 'react';
import { Switch } from '../../ui/switch.tsx';
import { PatternPanel } from './pattern/pattern-panel.tsx';
import { PhoneDock } from './phone/phone-dock.tsx';
import { PhoneTools } from './phone/phone-tools.tsx';
import { Clip } from './side/clip-panel.tsx';
import { ThreadStrip } from './side/thread-strip.tsx';

/** One column: the clip sticks, the thread runs under a fixed needle, one line is open between its neighbours. */
export function BenchPhone({ transcript }: { transcript: ReactNode }) {
  const [shows, setShows] = useState<'pattern' | 'transcript'>('pattern');
  return (
    <>
      <main className="grow">
        <div className="z-20 bg-chalk [@media(min-height:600px)]:sticky [@media(min-height:600px)]:top-0">
          <div className="[&>div]:aspect-auto! [&>div]:h-[150px]">
            <Clip />
          </div>
          <ThreadStrip fixedNeedle />
          <PhoneTools />
        </div>
        <div className="flex justify-center border-b border-feint bg-chalk py-1">
          <Switch
            label="Shown"
            value={shows}
            options={[
              { value: 'pattern', label: 'Pattern' },
              { value: 'transcript', label: 'Transcript' },
            ]}
            onChange={setShows}
          />
        </div>
        {shows === 'pattern' ? <PatternPanel /> : <div className="h-[60dvh] [&>section]:h-full">{transcript}</div>}
      </main>
      <PhoneDock />
    </>
  );
}
