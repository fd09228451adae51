import { Presentation } from 'lucide-react';
import { paths } from '../../lib/paths.ts';
import { LinkButton } from '../../ui/link-button.tsx';

/** To the card that a written pattern is read from while it is filmed. */
export const CardLink = ({ patternId }: { patternId: string }) => (
  <LinkButton
    icon={Presentation}
    to={paths.card(patternId)}
    aria-label="Filming card"
    title="Filming card"
    className="max-lg:[&>.word]:hidden"
  >
    <span className="word">Filming card</span>
  </LinkButton>
);
