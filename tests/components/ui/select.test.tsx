import { fireEvent, screen } from '@testing-library/react';
import { useState } from 'react';
import { placeMenu } from '@/components/ui/menu';
import { Select } from '@/components/ui/select';
import { show } from '../stage';

function Scanner() {
  const [value, setValue] = useState('');
  return (
    <Select
      label="scanner"
      rows={[
        { id: '', label: 'any' },
        { id: 'tern', label: 'Tern 3 T' },
      ]}
      value={value}
      onChange={setValue}
    />
  );
}

describe('a select', () => {
  test('opens a menu on which the keys work, and shows what was chosen', () => {
    show(<Scanner />);
    fireEvent.click(screen.getByRole('button', { name: 'scanner: any' }));
    const [any, tern] = screen.getAllByRole('menuitemradio');
    if (!any || !tern) throw new Error('no rows');
    expect(document.activeElement).toBe(any);
    fireEvent.keyDown(any, { key: 'ArrowDown' });
    expect(document.activeElement).toBe(tern);
    fireEvent.keyDown(tern, { key: ' ' });
    expect(screen.queryByRole('menu')).toBeNull();
    expect(screen.getByRole('button', { name: 'scanner: Tern 3 T' })).toBeTruthy();
  });

  test('its menu stays inside the window: over the control at the foot, within the right edge', () => {
    const screenSize = { width: 390, height: 844 };
    const atFoot = placeMenu({ left: 300, top: 780, width: 80, height: 44 }, 6, screenSize);
    expect(atFoot.top + atFoot.maxHeight).toBeLessThanOrEqual(780);
    expect(atFoot.left + atFoot.width).toBeLessThanOrEqual(390);
    const atHead = placeMenu({ left: 16, top: 100, width: 80, height: 44 }, 6, screenSize);
    expect(atHead.top).toBeGreaterThanOrEqual(144);
  });
});
