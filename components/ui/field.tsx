import { useId, useRef, useState, type ReactNode, type Ref } from 'react';
import { TextInput, View, type TextInputProps } from 'react-native';
import { line, measure, radius, space, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import { Icon } from './icon';
import { IconButton } from './icon-button';
import { Text, textStyle } from './text';
import { webAttributes, type KeyPress } from './web-attributes';

type FieldFrameProps = {
  readonly label: string;
  /** Id of the control that the label belongs to. */
  readonly controlId: string;
  readonly hint?: string;
  readonly error?: string;
  /** What was understood of the entry. */
  readonly understood?: string;
  readonly labelHidden?: boolean;
  readonly children: ReactNode;
};

/** Ids that tie a control to its hint, to what was understood, and to its error. */
export function describedBy(
  controlId: string,
  parts: { hint?: string; error?: string; understood?: string },
): string | undefined {
  const ids = [
    parts.hint ? `${controlId}-hint` : null,
    parts.understood ? `${controlId}-understood` : null,
    parts.error ? `${controlId}-error` : null,
  ].filter((id) => id !== null);
  return ids.length > 0 ? ids.join(' ') : undefined;
}

/** Label, control, hint and error as one; the error is announced when it appears. */
export function FieldFrame({
  label,
  controlId,
  hint,
  error,
  understood,
  labelHidden = false,
  children,
}: FieldFrameProps) {
  const { color } = useTheme();
  return (
    <View style={{ gap: space.xs, alignSelf: 'stretch', flexShrink: 1 }}>
      {labelHidden ? null : (
        <label htmlFor={controlId} style={{ color: color.ink }}>
          <Text variant="smallStrong">{label}</Text>
        </label>
      )}
      {children}
      {hint ? (
        <Text variant="small" tone="soft" id={`${controlId}-hint`}>
          {hint}
        </Text>
      ) : null}
      {understood && !error ? (
        <Text variant="smallFigures" tone="soft" id={`${controlId}-understood`}>
          {understood}
        </Text>
      ) : null}
      <View
        aria-live="polite"
        style={{ display: error ? 'flex' : 'none', flexDirection: 'row', gap: space.xs }}
      >
        {error ? (
          <>
            <Icon name="error" size="s" tone="lacking" />
            <Text variant="small" tone="lacking" id={`${controlId}-error`} style={{ flexShrink: 1 }}>
              {error}
            </Text>
          </>
        ) : null}
      </View>
    </View>
  );
}

export type FieldProps = {
  readonly label: string;
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly onBlur?: () => void;
  readonly onFocus?: () => void;
  /** `preventDefault` on Escape keeps it to the field: a dialog around it stays open. */
  readonly onKeyDown?: (event: KeyPress) => void;
  readonly hint?: string;
  readonly error?: string;
  readonly understood?: string;
  /** What stands in it is not what was taken over: a form around it is not sent. */
  readonly refused?: boolean;
  readonly labelHidden?: boolean;
  readonly placeholder?: string;
  readonly required?: boolean;
  readonly readOnly?: boolean;
  readonly multiline?: boolean;
  readonly secret?: boolean;
  /** Numbers stand in the semi condensed face with tabular figures. */
  readonly figures?: boolean;
  readonly autoComplete?: TextInputProps['autoComplete'];
  readonly inputMode?: TextInputProps['inputMode'];
  readonly autoFocus?: boolean;
  readonly maxLength?: number;
  readonly ref?: Ref<TextInput>;
  readonly testID?: string;
};

/** A line (or some lines) of text to fill in. */
export function Field({
  label,
  value,
  onChange,
  onBlur,
  onFocus,
  onKeyDown,
  hint,
  error,
  understood,
  refused = false,
  labelHidden = false,
  placeholder,
  required = false,
  readOnly = false,
  multiline = false,
  secret = false,
  figures = false,
  autoComplete,
  inputMode,
  autoFocus,
  maxLength,
  ref,
  testID,
}: FieldProps) {
  const { color } = useTheme();
  const id = useId();
  const [revealed, setRevealed] = useState(false);
  const escapeTaken = useRef(false);
  const keyUp = {
    // A dialog closes when Escape is let go.
    onKeyUp: (event: KeyPress) => {
      if (event.key === 'Escape' && escapeTaken.current) event.stopPropagation();
    },
  };
  return (
    <FieldFrame
      label={label}
      controlId={id}
      hint={hint}
      error={error}
      understood={understood}
      labelHidden={labelHidden}
    >
      <View style={{ flexDirection: 'row', gap: space.xs }}>
        <TextInput
          ref={ref}
          id={id}
          value={value}
          onChangeText={onChange}
          onBlur={onBlur}
          onFocus={onFocus}
          // A TextInput hands keys on here only; the event is the browser's, not the narrow one of its type.
          onKeyPress={(event) => {
            onKeyDown?.(event as unknown as KeyPress);
            escapeTaken.current = event.nativeEvent.key === 'Escape' && event.isDefaultPrevented();
          }}
          placeholder={placeholder}
          readOnly={readOnly}
          multiline={multiline}
          secureTextEntry={secret && !revealed}
          autoComplete={autoComplete}
          autoCapitalize={secret || inputMode === 'email' ? 'none' : undefined}
          autoCorrect={secret || figures || inputMode === 'email' ? false : undefined}
          inputMode={inputMode}
          autoFocus={autoFocus}
          maxLength={maxLength}
          // Enter takes an entry over and leaves the focus where it is.
          blurOnSubmit={false}
          testID={testID}
          aria-label={labelHidden ? label : undefined}
          {...webAttributes({
            'aria-describedby': describedBy(id, { hint, error, understood: error ? undefined : understood }),
            'aria-invalid': error ? true : undefined,
            'aria-required': required || undefined,
            dataSet: refused ? { refused: 'true' } : undefined,
          })}
          {...keyUp}
          style={[
            textStyle(figures ? 'figures' : 'body'),
            {
              flex: 1,
              minWidth: space.none,
              minHeight: multiline ? measure.note : target.min,
              paddingHorizontal: space.m,
              paddingVertical: space.s,
              borderWidth: error ? line.bold : line.hair,
              borderColor: error ? color.lacking : readOnly ? color.rule : color.edge,
              borderRadius: radius.m,
              backgroundColor: readOnly ? color.ground : color.sheet,
              color: color.ink,
            },
          ]}
        />
        {secret ? (
          <IconButton
            label={revealed ? 'Hide the password' : 'Show the password'}
            icon={revealed ? 'eye-off' : 'eye'}
            framed
            onPress={() => setRevealed(!revealed)}
          />
        ) : null}
      </View>
    </FieldFrame>
  );
}
