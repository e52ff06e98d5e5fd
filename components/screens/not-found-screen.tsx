import { LinkButton } from '@/components/ui/link';
import { EmptyState } from '@/components/ui/states';
import { DoorFrame } from './door-frame';

/** Nothing is at this address, or not for this member. */
export function NotFoundScreen() {
  return (
    <DoorFrame title="Nothing here">
      <EmptyState
        title="There is nothing at this address"
        text="The link may be old, or what it leads to belongs to another team."
      >
        <LinkButton href="/" label="To the start" primary />
      </EmptyState>
    </DoorFrame>
  );
}
