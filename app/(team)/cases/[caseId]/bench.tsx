import { useLocalSearchParams } from 'expo-router';
import { Bench } from '@/components/bench/bench';

export default function BenchRoute() {
  const { caseId, trial } = useLocalSearchParams<{ caseId: string; trial?: string }>();
  return <Bench caseId={caseId} trialId={trial} />;
}
