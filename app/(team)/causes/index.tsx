import { CausesScreen } from '@/components/cause/causes-screen';

export default function CausesRoute() {
  return <CausesScreen />;
}
