import { act, render, screen } from '@testing-library/react';
import { changePreferences, readPreferences, usePreferences } from '@/components/theme/preferences';

const KEY = 'elbowroom.preferences';

/** Puts a text where another tab would, and tells of it as a browser does. */
function writeElsewhere(text: string | null) {
  if (text === null) localStorage.removeItem(KEY);
  else localStorage.setItem(KEY, text);
  act(() => void window.dispatchEvent(new StorageEvent('storage', { key: KEY })));
}

function Unit() {
  return <p>{usePreferences().lengthUnit}</p>;
}

describe('preferences', () => {
  test('reach every part of the page at once, and stay in the browser', () => {
    render(<Unit />);
    expect(screen.getByText('mm')).toBeTruthy();
    act(() => changePreferences({ lengthUnit: 'in' }));
    expect(screen.getByText('in')).toBeTruthy();
    expect(JSON.parse(localStorage.getItem(KEY) ?? '{}')).toMatchObject({ lengthUnit: 'in' });
  });

  test('follow another tab', () => {
    render(<Unit />);
    writeElsewhere('{"lengthUnit":"in"}');
    expect(screen.getByText('in')).toBeTruthy();
    writeElsewhere(null);
    expect(screen.getByText('mm')).toBeTruthy();
  });

  test.each(['{', '7', 'null', '{"appearance":"loud","lengthUnit":"cubit"}'])(
    'that cannot be read count as never chosen: %s',
    (text) => {
      render(<Unit />);
      writeElsewhere(text);
      expect(readPreferences()).toEqual({ appearance: 'system', lengthUnit: 'mm' });
    },
  );
});
