import { Film } from 'lucide-react';
import { Icon } from '../../ui/icon.tsx';

/** A still from the clip itself, or the place where it will stand. */
export function ClipPicture({ url }: { url: string | undefined }) {
  if (url === undefined) {
    return (
      <div className="grid aspect-video w-full place-items-center border border-dashed border-edge bg-chalk text-walnut3 max-sm:hidden">
        <Icon of={Film} size={28} />
      </div>
    );
  }
  return (
    <video
      // The media fragment makes browsers show that moment instead of a black start.
      src={`${url}#t=2`}
      preload="metadata"
      muted
      playsInline
      tabIndex={-1}
      aria-hidden
      className="aspect-video w-full bg-walnut object-cover"
    />
  );
}
