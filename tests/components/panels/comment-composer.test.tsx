import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { CommentComposer } from '@/components/panels/comment-composer';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn } from '@/tests/support/press-key';

function Composer({
  onSend,
  busy = false,
  error,
}: {
  onSend: (text: string) => void;
  busy?: boolean;
  error?: string;
}) {
  const [text, setText] = useState('Does the ladder still fit?');
  return (
    <CommentComposer
      label="Your comment"
      sendLabel="Send"
      text={text}
      onTextChange={setText}
      onSend={() => onSend(text)}
      busy={busy}
      error={error}
    />
  );
}

const note = () => screen.getByRole<HTMLTextAreaElement>('textbox', { name: 'Your comment' });

describe('writing a comment', () => {
  test('Enter makes a new line; with Ctrl or the command key it sends', () => {
    const onSend = jest.fn();
    render(<Composer onSend={onSend} />);
    focusOn(note());
    expect(fireEvent.keyDown(note(), { key: 'Enter' })).toBe(true);
    expect(onSend).not.toHaveBeenCalled();
    fireEvent.keyDown(note(), { key: 'Enter', ctrlKey: true });
    fireEvent.keyDown(note(), { key: 'Enter', metaKey: true });
    expect(onSend.mock.calls).toEqual([['Does the ladder still fit?'], ['Does the ladder still fit?']]);
  });

  test('a refused comment stays to be mended, with the reason beside it', () => {
    render(<Composer onSend={() => undefined} error="Say something." />);
    expect(note().value).toBe('Does the ladder still fit?');
    expect(note().getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByText('Say something.')).toBeTruthy();
  });

  test('tells that it is on its way', () => {
    const onSend = jest.fn();
    render(<Composer onSend={onSend} busy />);
    fireEvent.click(screen.getByRole('button', { name: 'Send' }));
    expect(onSend).not.toHaveBeenCalled();
    expect(screen.getByText(/kept until it has arrived/)).toBeTruthy();
  });

  test('has no accessibility problem', async () => {
    render(<Composer onSend={() => undefined} />);
    expect(await accessibilityProblems()).toEqual([]);
  });
});
