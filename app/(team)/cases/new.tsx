import { useLocalSearchParams } from 'expo-router';
import { NewCase } from '@/components/case/new/new-case';

export default function NewCaseRoute() {
  const { saved, scanner } = useLocalSearchParams<{ saved?: string; scanner?: string }>();
  return <NewCase saved={saved} scannerId={scanner} />;
}
