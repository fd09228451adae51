import { useEffect } from 'react';
import { type Seat } from '#contract/live';
import { Initials } from '../../../ui/initials.tsx';
import { lineName } from './line-name.ts';
import { type Desk, lineOf, useDesk } from './use-desk.ts';

/** Tells the others which line is in hand. */
export function useTellSeat(desk: Desk): void {
  const { lineId } = desk;
  const { sit } = desk.bench;
  useEffect(() => sit(lineId), [sit, lineId]);
}

/** The people among the seats; somebody with two tabs open is one person, at the line they went to last. */
export function peopleAt(seats: readonly Seat[]): Seat[] {
  return [...new Map(seats.map((seat) => [seat.person.id, seat])).values()];
}

/** Who else is at this bench, and where: nothing while one is alone. */
export function Company() {
  const desk = useDesk();
  const { me } = desk.pattern;
  const others = peopleAt(desk.bench.seats);
  const words = (seat: Seat) => {
    const line = lineOf(desk, seat.lineId);
    const name = seat.person.id === me.id ? 'You, in another tab,' : seat.person.name;
    const verb = seat.person.id === me.id ? 'are' : 'is';
    return line ? `${name} ${verb} at ${lineName(line) || line.kind}` : `${name} ${verb} here`;
  };
  return (
    <span role="status" aria-label="Also here">
      {others.length > 0 && (
        <ul className="flex items-center gap-1">
          {others.map((seat) => (
            <li key={seat.person.id} title={words(seat)}>
              <Initials name={seat.person.name} />
              <span className="sr-only">{words(seat)}</span>
            </li>
          ))}
        </ul>
      )}
    </span>
  );
}

/** The initials of whoever has this line in hand, at its number. */
export function SittingHere({ lineId }: { lineId: string }) {
  const { seats } = useDesk().bench;
  const here = peopleAt(seats.filter((seat) => seat.lineId === lineId));
  if (here.length === 0) return null;
  return (
    <span className="pointer-events-none absolute top-[5px] left-[94px] z-10 flex -space-x-1.5 max-sm:top-[11px] max-sm:left-[52px]">
      {here.map(({ person }) => (
        <Initials key={person.id} name={person.name} size={22} />
      ))}
    </span>
  );
}
