import { useSortable } from '@dnd-kit/sortable';
import { GripVertical } from 'lucide-react';
import { type ReactNode } from 'react';
import { cx } from '../../../lib/class-names.ts';
import { Icon } from '../../../ui/icon.tsx';
import { SittingHere } from '../desk/company.tsx';

/** A line that can be taken by its handle and put elsewhere; the handle is a button, so that the list stays a list. */
export function SortableLine({
  id,
  name,
  canMove,
  children,
}: {
  id: string;
  name: string;
  canMove: boolean;
  children: ReactNode;
}) {
  const { setNodeRef, setActivatorNodeRef, attributes, listeners, transform, transition, isDragging } = useSortable({
    id,
    disabled: !canMove,
  });
  return (
    <li
      ref={setNodeRef}
      style={transform ? { transform: `translateY(${transform.y}px)`, transition } : undefined}
      className={cx('group relative', isDragging && 'z-20 opacity-90 outline-[1.5px] outline-woad')}
    >
      {children}
      <SittingHere lineId={id} />
      {canMove && (
        <button
          ref={setActivatorNodeRef}
          type="button"
          {...attributes}
          {...listeners}
          aria-label={`Move ${name}`}
          className="absolute top-0 left-0 flex h-[31px] w-3.5 cursor-grab touch-none items-center justify-center text-walnut3 opacity-0 group-hover:opacity-100 focus-visible:opacity-100 max-sm:hidden"
        >
          <Icon of={GripVertical} size={14} />
        </button>
      )}
    </li>
  );
}
