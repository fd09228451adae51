import { Expand, List, Moon, Printer, Shrink, Sun, X, ZoomIn, ZoomOut } from 'lucide-react';
import { Link } from 'react-router-dom';
import { paths } from '../../lib/paths.ts';
import { IconButton } from '../../ui/button.tsx';
import { Icon } from '../../ui/icon.tsx';
import { SIZES } from './use-card.ts';
import { useFullScreen } from './use-full-screen.ts';

interface CardHeadProps {
  patternId: string;
  title: string;
  terms: string;
  /** "line 9 of 24"; empty where there is nothing to read. */
  place: string;
  size: number;
  isDark: boolean;
  hasList: boolean;
  onSize: (size: number) => void;
  onLight: () => void;
  onList: () => void;
}

/** What can be done with the card, small at its upper edge. */
export function CardHead(props: CardHeadProps) {
  const { isFull, turn } = useFullScreen();
  const { size, onSize } = props;
  return (
    <header className="flex min-h-[46px] flex-none items-center gap-x-3 border-b border-rule pr-2 pl-5 max-sm:gap-x-1 max-sm:pl-3 print:hidden">
      <h1 className="h-page min-w-0 truncate max-sm:text-[17px]!">{props.title}</h1>
      <span className="text-walnut2 whitespace-nowrap max-sm:sr-only">{props.terms} terms</span>
      <span className="ml-auto whitespace-nowrap text-walnut2 max-sm:sr-only">{props.place}</span>
      <div role="group" aria-label="The card" className="flex items-center">
        <IconButton
          icon={ZoomOut}
          label="Smaller"
          aria-keyshortcuts="-"
          className="size-9"
          aria-disabled={size === 0}
          onClick={() => onSize(size - 1)}
        />
        <IconButton
          icon={ZoomIn}
          label="Larger"
          aria-keyshortcuts="+"
          className="size-9"
          aria-disabled={size === SIZES.length - 1}
          onClick={() => onSize(size + 1)}
        />
        <IconButton
          icon={List}
          label="All lines"
          aria-keyshortcuts="L"
          aria-expanded={props.hasList}
          className="size-9"
          onClick={props.onList}
        />
        <IconButton
          icon={props.isDark ? Sun : Moon}
          label={props.isDark ? 'Light' : 'Dark'}
          aria-keyshortcuts="D"
          className="size-9"
          onClick={props.onLight}
        />
        <IconButton
          icon={Printer}
          label="Print the card"
          className="size-9 max-sm:hidden"
          onClick={() => window.print()}
        />
        {turn && (
          <IconButton
            icon={isFull ? Shrink : Expand}
            label={isFull ? 'Leave the full screen' : 'Full screen'}
            aria-keyshortcuts="F"
            className="size-9 max-sm:hidden"
            onClick={turn}
          />
        )}
        <Link
          to={paths.bench(props.patternId)}
          aria-label="Close, to the bench"
          title="Close"
          className="icon-btn size-9"
        >
          <Icon of={X} size={20} />
        </Link>
      </div>
    </header>
  );
}
