import { fireEvent, screen, waitFor } from '@testing-library/react';
import { safePath } from '@/components/team/places';
import { SignInForm } from '@/components/team/sign-in-form';
import { answerWith, problem } from '../network';
import { show } from '../stage';

const type = (label: string, text: string): void => {
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } });
};

describe('signing in', () => {
  test('with a wrong password marks the password, and does not say which half was wrong', async () => {
    const asked = answerWith(() => problem(401, 'wrong-credentials', 'E-mail or password is wrong'));
    show(<SignInForm />);
    type('e-mail', 'a.physicist@alderweir.example');
    type('password', 'not this');
    fireEvent.click(screen.getByRole('button', { name: 'sign in' }));
    await waitFor(() => expect(screen.getByRole('alert').textContent).toContain('E-mail or password is wrong.'));
    expect(screen.getByLabelText('password').getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByLabelText('e-mail').getAttribute('aria-invalid')).not.toBe('true');
    expect(asked).toHaveLength(1);
  });

  test('with nothing typed asks nobody and marks both fields', () => {
    const asked = answerWith(() => null);
    show(<SignInForm />);
    fireEvent.click(screen.getByRole('button', { name: 'sign in' }));
    expect(screen.getAllByRole('alert')).toHaveLength(2);
    expect(asked).toEqual([]);
  });

  test('after too many attempts shows the words of the server, not a wrong password', async () => {
    answerWith(() => problem(429, 'too-many-attempts', 'Too many attempts: try again in 15 minutes'));
    show(<SignInForm />);
    type('e-mail', 'a.physicist@alderweir.example');
    type('password', 'not this');
    fireEvent.click(screen.getByRole('button', { name: 'sign in' }));
    await waitFor(() => expect(screen.getByRole('alert').textContent).toContain('try again in 15 minutes'));
    expect(screen.getByLabelText('password').getAttribute('aria-invalid')).not.toBe('true');
  });

  // OWASP, Unvalidated Redirects and Forwards: an address from outside is never followed after signing in.
  test('leads on to a path of our own only', () => {
    expect(safePath('/cases/new?scanner=3')).toBe('/cases/new?scanner=3');
    for (const path of ['https://evil.example', '//evil.example', '/\\evil.example', 'javascript:alert(1)', undefined]) {
      expect(safePath(path)).toBe('/cases');
    }
  });
});
