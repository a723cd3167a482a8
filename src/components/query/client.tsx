import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { ApiProblem } from './api';

function makeClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 30_000,
        // A refusal will not change by asking again; a lost connection may.
        retry: (count, error) => count < 3 && (!(error instanceof ApiProblem) || error.status === 0),
        refetchOnWindowFocus: true,
      },
      mutations: { retry: false },
    },
  });
}

/** One query cache for an island. */
export function QueryProvider({ children }: { readonly children: ReactNode }) {
  const [client] = useState(makeClient);
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
