import { createEvent, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Sheet, type SheetStop } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';

function Results({ first }: { readonly first: SheetStop }) {
  const [stop, setStop] = useState<SheetStop>(first);
  return (
    <Sheet label="Results" stop={stop} onStopChange={setStop} head={<Text>Head</Text>}>
      <Text>Below</Text>
    </Sheet>
  );
}

const stopNow = () => screen.getByRole('slider').getAttribute('aria-valuetext');

/** A mouse event with what jsdom leaves out: where on the page, and when. */
function mouse(kind: 'mouseDown' | 'mouseMove' | 'mouseUp', y: number, time: number) {
  const head = screen.getByText('Head');
  const event = createEvent[kind](head, {
    button: 0,
    buttons: kind === 'mouseUp' ? 0 : 1,
    clientX: 9,
    clientY: y,
  });
  Object.defineProperties(event, {
    pageX: { value: 9 },
    pageY: { value: y },
    timeStamp: { value: time },
  });
  fireEvent(head, event);
}

/** Pulls the head by some pixels (down is positive), a tenth each `pace` ms, lets go and clicks as a browser does then. */
function pull(pixels: number, pace = 100) {
  mouse('mouseDown', 400, 1000);
  for (let step = 1; step <= 10; step += 1)
    mouse('mouseMove', 400 + (pixels * step) / 10, 1000 + pace * step);
  mouse('mouseUp', 400 + pixels, 1000 + 11 * pace);
  fireEvent.click(screen.getByText('Head'));
}

describe('a sheet that is pulled', () => {
  test('goes to the stop that is nearest where it is let go, and the click that follows moves nothing', () => {
    render(<Results first="half" />);
    // jsdom's window is 768 px high: half is at 384 px, full at 676, peek at 168
    pull(-250);
    expect(stopNow()).toBe('full');
    pull(280);
    expect(stopNow()).toBe('half');
    pull(200);
    expect(stopNow()).toBe('peek');
  });

  test('goes on to the next stop when it is flicked, however short', () => {
    render(<Results first="half" />);
    // 40 px in 50 ms: 0.8 px a millisecond
    pull(-40, 5);
    expect(stopNow()).toBe('full');
    pull(40, 5);
    expect(stopNow()).toBe('half');
  });

  test('goes back when it was pulled too little', () => {
    render(<Results first="half" />);
    pull(-40);
    expect(stopNow()).toBe('half');
  });

  test('a press after a pull is a press again', () => {
    render(<Results first="half" />);
    pull(-250);
    expect(stopNow()).toBe('full');
    pull(0);
    expect(stopNow()).toBe('peek');
  });
});
