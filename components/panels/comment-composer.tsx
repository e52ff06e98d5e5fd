import type { ReactNode } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Text } from '@/components/ui/text';

type CommentComposerProps = {
  /** What is being written: "Comment on A2 UHF", "Reply to 3". */
  readonly label: string;
  readonly text: string;
  readonly onTextChange: (text: string) => void;
  readonly sendLabel: string;
  readonly onSend: () => void;
  readonly onDiscard?: () => void;
  /** Why it was not sent; what was typed is still there. */
  readonly error?: string;
  readonly busy: boolean;
  readonly autoFocus?: boolean;
  /** Where it points at, above the text. */
  readonly children?: ReactNode;
};

/** Where a comment or a reply is written. What was typed belongs to the caller and outlives a refusal. */
export function CommentComposer({
  label,
  text,
  onTextChange,
  sendLabel,
  onSend,
  onDiscard,
  error,
  busy,
  autoFocus = false,
  children,
}: CommentComposerProps) {
  return (
    <Form label={label} onSubmit={onSend}>
      <View style={{ gap: space.s }}>
        {children}
        <Field
          label={label}
          value={text}
          onChange={onTextChange}
          multiline
          error={error}
          autoFocus={autoFocus}
          onKeyDown={(event) => {
            if (event.key !== 'Enter' || !(event.ctrlKey || event.metaKey)) return;
            event.preventDefault();
            onSend();
          }}
        />
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>
          <Button label={sendLabel} variant="primary" icon="send" onPress={onSend} busy={busy} />
          {onDiscard ? <Button label="Discard" variant="quiet" onPress={onDiscard} disabled={busy} /> : null}
        </View>
        {busy ? (
          <Text variant="small" tone="soft" live="polite">
            Sending. What you typed is kept until it has arrived.
          </Text>
        ) : null}
      </View>
    </Form>
  );
}
