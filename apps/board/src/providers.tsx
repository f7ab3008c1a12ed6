import { QueryClientProvider } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';

interface ProvidersProps {
  readonly client: QueryClient;
  readonly children: ReactNode;
}

export function Providers({ client, children }: ProvidersProps) {
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
