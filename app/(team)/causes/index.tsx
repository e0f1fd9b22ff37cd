import { useLocalSearchParams, useRouter } from 'expo-router';
import { CausesScreen } from '@/components/cause/causes-screen';

export default function CausesRoute() {
  const router = useRouter();
  return <CausesScreen params={useLocalSearchParams()} onParams={router.setParams} />;
}
