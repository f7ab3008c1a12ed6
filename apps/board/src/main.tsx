import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { createQueryClient } from './api/query-client.ts';
import { Providers } from './providers.tsx';
import { createRouter } from './router.tsx';
import { applyTheme, chosenTheme } from './ui/theme.ts';
import './styles/board.css';

// zod probes for `new Function`, which the content security policy forbids and reports. It reads this where it is
// loaded, which is late: only forms that check before they send need it.
Object.assign(globalThis, { __zod_globalConfig: { jitless: true } });

// Before the first drawing, so that the page never changes its colours in view.
applyTheme(chosenTheme());

const client = createQueryClient();
const root = document.getElementById('root');
if (root === null) throw new Error('The page has no root element');
createRoot(root).render(
  <StrictMode>
    <Providers client={client}>
      <RouterProvider router={createRouter(client)} />
    </Providers>
  </StrictMode>,
);
