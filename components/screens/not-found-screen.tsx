import { LinkButton } from '@/components/ui/link';
import { DoorFrame } from './door-frame';

/** Nothing is at this address, or not for this member. */
export function NotFoundScreen() {
  return (
    <DoorFrame
      title="There is nothing at this address"
      lead="The link may be old, or what it leads to belongs to another team."
    >
      <LinkButton href="/" label="To the start" primary />
    </DoorFrame>
  );
}
