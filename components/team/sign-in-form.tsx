/** Signing in: e-mail and password. What is wrong stands under the field it concerns; a wrong pair never says which half. */
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { ApiProblem } from '@/components/api/api-problem';
import { useSignIn } from '@/components/api/session';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { TextField } from '@/components/ui/text-field';
import { space } from '@/components/ui/theme';
import { safePath } from './places';

const atPassword = (error: Error | null): string | undefined =>
  error instanceof ApiProblem && error.code === 'wrong-credentials' ? 'E-mail or password is wrong.' : undefined;

export function SignInForm({ then }: { then?: string | undefined }) {
  const router = useRouter();
  const signIn = useSignIn();
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [asked, setAsked] = useState(false);
  const missing = { email: asked && email.trim() === '', password: asked && password === '' };
  const submit = (): void => {
    setAsked(true);
    if (email.trim() === '' || password === '' || signIn.isPending) return;
    signIn.mutate({ email: email.trim(), password }, { onSuccess: () => router.replace(safePath(then) as '/cases') });
  };
  const elsewhere = signIn.error && !atPassword(signIn.error) ? signIn.error.message : null;
  return (
    <View role="form" aria-label="sign in" style={{ gap: space(4) }}>
      <TextField
        label="e-mail"
        value={email}
        onChange={setEmail}
        error={missing.email ? 'Type the e-mail of your account.' : undefined}
        autoFocus
        input={{ autoComplete: 'username', inputMode: 'email', autoCapitalize: 'none', spellCheck: false, onSubmitEditing: submit }}
      />
      <TextField
        label="password"
        value={password}
        onChange={setPassword}
        secret
        error={missing.password ? 'Type your password.' : atPassword(signIn.error)}
        input={{ autoComplete: 'current-password', onSubmitEditing: submit }}
      />
      {elsewhere ? <Notice kind="failed" text={elsewhere} /> : null}
      <Button label="sign in" kind="first" tall onPress={submit} busy={signIn.isPending} style={{ marginTop: space(2) }} />
    </View>
  );
}
