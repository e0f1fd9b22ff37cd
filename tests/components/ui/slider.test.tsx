/** The slider on the web: WAI-ARIA 1.2 slider practice (a name, a spoken value with its unit, arrow keys by the browser's own input). */
import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Slider } from '@/components/ui/slider';

const onLetGo = jest.fn();

function Frequency({ start = 0.25, error }: { start?: number; error?: string }) {
  const [value, setValue] = useState(start);
  return (
    <Slider
      label="Frequency"
      unit="Hz"
      min={0.05}
      max={3}
      step={0.005}
      initial={0.25}
      value={value}
      onChange={setValue}
      onLetGo={onLetGo}
      error={error}
    />
  );
}

const range = () => screen.getByRole('slider', { name: 'Frequency' });
const field = () => screen.getByRole<HTMLInputElement>('textbox', { name: 'Frequency, Hz' });

beforeEach(() => onLetGo.mockClear());

describe('a slider', () => {
  it('speaks its value with the unit', () => {
    render(<Frequency />);
    expect(range().getAttribute('aria-valuetext')).toBe('0.250 Hz');
  });

  it('follows the hand, and says when the hand lets go', () => {
    render(<Frequency />);
    fireEvent.change(range(), { target: { value: '0.3' } });
    expect(range().getAttribute('aria-valuetext')).toBe('0.300 Hz');
    expect(onLetGo).not.toHaveBeenCalled();
    fireEvent.pointerUp(range());
    expect(onLetGo).toHaveBeenCalledTimes(1);
  });

  it('takes a typed value on Enter, with a decimal comma too', () => {
    render(<Frequency />);
    fireEvent.change(field(), { target: { value: '1,2' } });
    fireEvent.keyDown(field(), { key: 'Enter' });
    expect(range().getAttribute('aria-valuetext')).toBe('1.200 Hz');
  });

  it('refuses a typed value beyond its range, names the range and keeps the old value', () => {
    render(<Frequency />);
    fireEvent.change(field(), { target: { value: '7' } });
    fireEvent.blur(field());
    expect(screen.getByRole('alert').textContent).toBe('0.050 – 3.000: 7 is not in this range');
    expect(range().getAttribute('aria-valuetext')).toBe('0.250 Hz');
    expect(range().getAttribute('aria-invalid')).toBe('true');
  });

  it('shows what the server said about its value', () => {
    render(<Frequency error="frequency must be at least 0.05" />);
    expect(screen.getByRole('alert').textContent).toBe('frequency must be at least 0.05');
  });
});
