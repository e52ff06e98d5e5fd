import { describePageError } from '@/components/api/api-problem';
import { Button } from '@/components/ui/button';
import { DoorFrame } from './door-frame';

/** The page broke, or a piece of it did not arrive: what to do. What was typed is kept and stands there again. */
export function PageErrorScreen({ error }: { readonly error: Error }) {
  return (
    <DoorFrame title="This page cannot go on" lead={describePageError(error)}>
      <Button
        label="Load the page again"
        icon="refresh"
        variant="primary"
        onPress={() => globalThis.location.reload()}
        wide
      />
    </DoorFrame>
  );
}
