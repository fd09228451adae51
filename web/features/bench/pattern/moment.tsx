import { ChevronLeft, ChevronRight, MapPin } from 'lucide-react';
import { formatTenths, speakMoment } from '../../../lib/time.ts';
import { Button } from '../../../ui/button.tsx';
import { mainMark } from '../desk/moments.ts';
import { markAtPlayhead, nudgeMoment } from '../desk/marking.ts';
import { useDesk } from '../desk/use-desk.ts';

/** The open line's moment to the tenth, with the two keys that nudge it; or the button that gives it one. */
export function Moment({ lineId }: { lineId: string }) {
  const desk = useDesk();
  const mark = mainMark(desk.pattern.marks, lineId);
  if (!mark) {
    if (!desk.pattern.mayEdit || !desk.recordingId) return <span className="small text-walnut3">no moment</span>;
    return (
      <Button kind="quiet" size="row" icon={MapPin} onClick={() => markAtPlayhead(desk)}>
        Mark here
      </Button>
    );
  }
  return (
    <span
      className="flex items-center gap-1 whitespace-nowrap"
      role="group"
      aria-label={`Its moment, ${speakMoment(mark.startMs)}`}
    >
      <span className="small mr-0.5 text-walnut3">{formatTenths(mark.startMs)}</span>
      {desk.pattern.mayEdit && (
        <>
          <Nudge key="back" name="A tenth earlier" cap="[" onPress={() => nudgeMoment(desk, -1)} />
          <Nudge key="on" name="A tenth later" cap="]" onPress={() => nudgeMoment(desk, 1)} />
        </>
      )}
    </span>
  );
}

/** The key itself is the button; under a finger it is an arrow. */
function Nudge({ name, cap, onPress }: { name: string; cap: '[' | ']'; onPress: () => void }) {
  const Glyph = cap === '[' ? ChevronLeft : ChevronRight;
  return (
    <button
      type="button"
      aria-label={name}
      title={name}
      aria-keyshortcuts={cap}
      onClick={onPress}
      className="rounded-2 hover:bg-woadwash max-sm:grid max-sm:size-11 max-sm:place-items-center"
    >
      <span className="key max-sm:hidden" aria-hidden>
        {cap}
      </span>
      <Glyph size={20} strokeWidth={1.4} aria-hidden className="sm:hidden" />
    </button>
  );
}
