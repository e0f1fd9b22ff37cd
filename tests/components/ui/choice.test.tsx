import { fireEvent, screen } from '@testing-library/react';
import { useState } from 'react';
import { Choice } from '@/components/ui/choice';
import { show } from '../stage';

const options = [
  { value: 'once', label: 'once' },
  { value: 'often', label: 'on and off' },
  { value: 'always', label: 'every scan' },
] as const;
type Often = (typeof options)[number]['value'];

function One() {
  const [value, setValue] = useState<Often | null>(null);
  return <Choice label="How often?" options={options} value={value} onChange={setValue} />;
}
function Some() {
  const [value, setValue] = useState<readonly Often[]>(['once']);
  return <Choice<Often> many label="How often?" options={options} value={value} onChange={setValue} />;
}
const checked = (role: 'radio' | 'checkbox'): string[] =>
  screen
    .getAllByRole(role)
    .filter((one) => one.getAttribute('aria-checked') === 'true')
    .map((one) => one.getAttribute('aria-label') ?? '');

describe('a choice', () => {
  test('of one: Space chooses, and the arrows carry the choice on and around the end', () => {
    show(<One />);
    const [first] = screen.getAllByRole('radio');
    if (!first) throw new Error('no radio');
    fireEvent.keyDown(first, { key: ' ' });
    expect(checked('radio')).toEqual(['once']);
    fireEvent.keyDown(first, { key: 'ArrowUp' });
    expect(checked('radio')).toEqual(['every scan']);
    expect(document.activeElement?.getAttribute('aria-label')).toBe('every scan');
  });

  test('of one: a single radio is in the tab order', () => {
    show(<One />);
    expect(screen.getAllByRole('radio').filter((radio) => radio.getAttribute('tabindex') === '0')).toHaveLength(1);
  });

  test('of many: Space takes one in and out, the others stay', () => {
    show(<Some />);
    const [once, , always] = screen.getAllByRole('checkbox');
    if (!once || !always) throw new Error('no checkbox');
    fireEvent.keyDown(always, { key: ' ' });
    expect(checked('checkbox')).toEqual(['once', 'every scan']);
    fireEvent.keyDown(once, { key: ' ' });
    expect(checked('checkbox')).toEqual(['every scan']);
  });
});
