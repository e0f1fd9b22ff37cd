import { ScannersScreen } from '@/components/scanner/scanners-screen';

export default function ScannersRoute() {
  return <ScannersScreen />;
}
