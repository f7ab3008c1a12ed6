/** The floor of the stack: one list page with router and query, and nothing else. */
import { QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query';
import { createRoot } from 'react-dom/client';
import { createBrowserRouter, RouterProvider } from 'react-router-dom';

interface Named {
  readonly id: number;
  readonly name: string;
}

function Names() {
  const names = useQuery({
    queryKey: ['names'],
    queryFn: async () => (await (await fetch('/names')).json()) as Named[],
  }); // the reference server's own answer
  return (
    <main>
      <h1>Names</h1>
      <ul>
        {(names.data ?? []).map((one) => (
          <li key={one.id}>{one.name}</li>
        ))}
      </ul>
    </main>
  );
}

const root = document.getElementById('root');
if (root === null) throw new Error('The page has no root element');
createRoot(root).render(
  <QueryClientProvider client={new QueryClient()}>
    <RouterProvider router={createBrowserRouter([{ path: '/', Component: Names }])} />
  </QueryClientProvider>,
);
