import { QueryClientProvider } from '@tanstack/react-query';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router';

import { applyLamp } from './app/layout/use-lamp.ts';
import { router } from './app/router.tsx';
import { createQueryClient } from './lib/query-client.ts';
import './styles/index.css';

applyLamp();
const place = document.getElementById('app');
if (place === null) throw new Error('The page has no place for the app.');
createRoot(place).render(
  <StrictMode>
    <QueryClientProvider client={createQueryClient()}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  </StrictMode>,
);
