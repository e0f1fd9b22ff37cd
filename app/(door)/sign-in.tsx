import { useLocalSearchParams } from 'expo-router';
import { Door } from '@/components/team/door';

export default function SignInRoute() {
  const { then } = useLocalSearchParams<{ then?: string }>();
  return <Door then={then} />;
}
