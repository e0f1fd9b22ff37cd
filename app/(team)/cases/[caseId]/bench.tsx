import { useLocalSearchParams } from 'expo-router';
import { Bench } from '@/components/bench/bench';

export default function BenchRoute() {
  const { caseId, trial, add } = useLocalSearchParams<{ caseId: string; trial?: string; add?: string }>();
  return <Bench caseId={caseId} trialId={trial} add={add} />;
}
