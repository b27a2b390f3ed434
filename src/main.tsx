import './styles/main.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { Providers } from './app/providers.tsx';
import { createAppRouter } from './app/router.tsx';
import { createQueryClient } from './lib/query-client.ts';
import { restoreTheme } from './lib/theme.ts';

restoreTheme();
const client = createQueryClient();
const router = createAppRouter(client);
createRoot(document.getElementById('root')!).render(
  <StrictMode>
    <Providers client={client}>
      <RouterProvider router={router} />
    </Providers>
  </StrictMode>,
);
