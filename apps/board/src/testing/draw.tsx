/** Draws a component as inside the product: a router and a cache of its own, without retries. */
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import type { ReactElement } from 'react';
import { MemoryRouter } from 'react-router-dom';

export const draw = (element: ReactElement, at = '/') => {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false }, mutations: { retry: false } } });
  return {
    client,
    ...render(
      <QueryClientProvider client={client}>
        <MemoryRouter initialEntries={[at]}>{element}</MemoryRouter>
      </QueryClientProvider>,
    ),
  };
};
