import { Button } from './button';
import { Dialog } from './dialog';
import { Notice } from './notice';
import { Text } from './text';

type ConfirmDialogProps = {
  readonly open: boolean;
  readonly title: string;
  readonly text: string;
  /** What the confirming button does, as a verb. */
  readonly confirmLabel: string;
  readonly onConfirm: () => void;
  readonly onClose: () => void;
  readonly busy?: boolean;
  readonly error?: string | null;
  readonly dangerous?: boolean;
};

/** A question before something that is not easily taken back. */
export function ConfirmDialog({
  open,
  title,
  text,
  confirmLabel,
  onConfirm,
  onClose,
  busy = false,
  error = null,
  dangerous = false,
}: ConfirmDialogProps) {
  return (
    <Dialog
      open={open}
      title={title}
      onClose={onClose}
      actions={
        <>
          <Button label="Cancel" onPress={onClose} />
          <Button
            label={confirmLabel}
            variant={dangerous ? 'danger' : 'primary'}
            onPress={onConfirm}
            busy={busy}
          />
        </>
      }
    >
      <Text>{text}</Text>
      {error ? <Notice kind="error" text={error} /> : null}
    </Dialog>
  );
}
