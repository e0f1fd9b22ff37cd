/** What stands around a component on the page: the cache of what was fetched, and the theme. */
import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import type { ReactElement } from 'react';
import { createQueryClient } from '@/components/api/query-client';
import { ThemeProvider } from '@/components/ui/theme-provider';

export function show(element: ReactElement) {
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { retry: false } });
  return render(
    <QueryClientProvider client={client}>
      <ThemeProvider>{element}</ThemeProvider>
    </QueryClientProvider>,
  );
}
