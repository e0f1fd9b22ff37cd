import { useLocalSearchParams, useRouter } from 'expo-router';
import { CasesScreen } from '@/components/case/list/cases-screen';

export default function CasesRoute() {
  const router = useRouter();
  return <CasesScreen params={useLocalSearchParams()} onParams={router.setParams} />;
}
