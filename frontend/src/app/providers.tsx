import { QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { createQueryClient } from '../lib/query-client.js';
import { PageInfoProvider } from '../ui/page-info.js';
import { ThemeProvider } from '../ui/theme/theme-provider.js';
import { createRouter } from './router.js';

export function Providers() {
  const [client] = useState(createQueryClient);
  const [router] = useState(() => createRouter(client));
  return (
    <QueryClientProvider client={client}>
      <ThemeProvider>
        <PageInfoProvider>
          <RouterProvider router={router} />
        </PageInfoProvider>
      </ThemeProvider>
    </QueryClientProvider>
  );
}
