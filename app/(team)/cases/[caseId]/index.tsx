import { useLocalSearchParams } from 'expo-router';
import { CaseScreen } from '@/components/case/view/case-screen';

export default function CaseRoute() {
  const { caseId } = useLocalSearchParams<{ caseId: string }>();
  return <CaseScreen key={caseId} caseId={caseId} />;
}
