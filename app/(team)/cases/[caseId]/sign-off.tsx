import { useLocalSearchParams } from 'expo-router';
import { SignOffScreen } from '@/components/case/sign/sign-off-screen';

export default function SignOffRoute() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <SignOffScreen key={caseId} caseId={caseId} />;
}
