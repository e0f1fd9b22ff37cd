import { AtkinsonHyperlegible_400Regular } from '@expo-google-fonts/atkinson-hyperlegible/400Regular';
import { AtkinsonHyperlegible_700Bold } from '@expo-google-fonts/atkinson-hyperlegible/700Bold';
import { JetBrainsMono_400Regular } from '@expo-google-fonts/jetbrains-mono/400Regular';
import { JetBrainsMono_500Medium } from '@expo-google-fonts/jetbrains-mono/500Medium';
import { JetBrainsMono_600SemiBold } from '@expo-google-fonts/jetbrains-mono/600SemiBold';
import { QueryClientProvider } from '@tanstack/react-query';
import { useFonts } from 'expo-font';
import { Slot, usePathname } from 'expo-router';
import { useState } from 'react';
import { createQueryClient } from '@/components/api/query-client';
import { ThemeProvider } from '@/components/ui/theme-provider';

export default function RootLayout() {
  const [client] = useState(createQueryClient);
  const onBench = usePathname().endsWith('/bench');
  const [fontsLoaded, fontsFailed] = useFonts({
    AtkinsonHyperlegible_400Regular,
    AtkinsonHyperlegible_700Bold,
    JetBrainsMono_400Regular,
    JetBrainsMono_500Medium,
    JetBrainsMono_600SemiBold,
  });
  return (
    <QueryClientProvider client={client}>
      <ThemeProvider onBench={onBench}>{fontsLoaded || fontsFailed ? <Slot /> : null}</ThemeProvider>
    </QueryClientProvider>
  );
}
