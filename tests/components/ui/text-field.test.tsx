import { fireEvent, screen } from '@testing-library/react';
import { TextField } from '@/components/ui/text-field';
import { show } from '../stage';

const described = (field: HTMLElement): string => document.getElementById(field.getAttribute('aria-describedby') ?? '')?.textContent ?? '';

describe('a field', () => {
  test('that is wrong is marked, and the reason is tied to it', () => {
    show(<TextField label="frequency, Hz" value="1.4" onChange={() => undefined} error="0.10 – 0.40: above it the ghost repeats" />);
    const field = screen.getByRole('textbox', { name: 'frequency, Hz' });
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(described(field)).toContain('0.10 – 0.40');
    expect(screen.getByRole('alert').textContent).toContain('above it the ghost repeats');
  });

  test('that is right is not marked', () => {
    show(<TextField label="serial" value="20-0417" onChange={() => undefined} note="read from the header" />);
    const field = screen.getByRole('textbox', { name: 'serial' });
    expect(field.getAttribute('aria-invalid')).not.toBe('true');
    expect(described(field)).toBe('read from the header');
    expect(screen.queryByRole('alert')).toBeNull();
  });

  test('asks about doubtful words without standing in the way, and lets them be kept', () => {
    const onKeep = jest.fn();
    show(<TextField label="tried" value="Mr Hale moved" onChange={() => undefined} question={{ text: 'Is this a name?', onKeep }} />);
    expect(screen.getByRole('textbox', { name: 'tried' }).getAttribute('aria-invalid')).not.toBe('true');
    fireEvent.click(screen.getByRole('button', { name: 'keep it' }));
    expect(onKeep).toHaveBeenCalledTimes(1);
  });

  test('that is disabled takes nothing', () => {
    show(<TextField label="serial" value="20-0417" onChange={() => undefined} disabled />);
    expect(screen.getByRole('textbox', { name: 'serial' }).hasAttribute('readonly')).toBe(true);
  });
});
