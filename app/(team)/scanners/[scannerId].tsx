import { useLocalSearchParams } from 'expo-router';
import { ScannerScreen } from '@/components/scanner/scanner-screen';

export default function ScannerRoute() {
  const { scannerId } = useLocalSearchParams<{ scannerId: string }>();
  return <ScannerScreen key={scannerId} scannerId={scannerId} />;
}
