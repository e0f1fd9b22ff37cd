import { useLocalSearchParams } from 'expo-router';
import { CauseScreen } from '@/components/cause/cause-screen';

export default function CauseRoute() {
  const { causeId } = useLocalSearchParams<{ causeId: string }>();
  return <CauseScreen causeId={causeId} />;
}
