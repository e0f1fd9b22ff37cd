import { fireEvent, screen } from '@testing-library/react';
import { Button } from '@/components/ui/button';
import { show } from '../stage';

describe('a button', () => {
  test('does what it says when it is pressed', () => {
    const onPress = jest.fn();
    show(<Button label="sign off" kind="first" onPress={onPress} />);
    fireEvent.click(screen.getByRole('button', { name: 'sign off' }));
    expect(onPress).toHaveBeenCalledTimes(1);
  });

  test('does nothing while it is disabled, and says that it is and what it waits for', () => {
    const onPress = jest.fn();
    show(<Button label="sign off" disabled hint="waits for the case number" onPress={onPress} />);
    const button = screen.getByRole('button', { name: 'sign off' });
    fireEvent.click(button);
    expect(onPress).not.toHaveBeenCalled();
    expect(button.getAttribute('aria-disabled')).toBe('true');
    expect(document.getElementById(button.getAttribute('aria-describedby') ?? '')?.textContent).toBe('waits for the case number');
  });

  test('is not pressed twice while its work is under way', () => {
    const onPress = jest.fn();
    show(<Button label="sending" busy={0.5} onPress={onPress} />);
    const button = screen.getByRole('button', { name: 'sending' });
    fireEvent.click(button);
    expect(onPress).not.toHaveBeenCalled();
    expect(button.getAttribute('aria-busy')).toBe('true');
  });
});
