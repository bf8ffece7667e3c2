import { createBrowserRouter, Navigate } from 'react-router';

import { ErrorPage, NothingHere } from './layout/ErrorPage.tsx';
import { Layout } from './layout/Layout.tsx';
import { DeskPage } from './pages/DeskPage.tsx';

/** Every address of the client. Screens other than the desk load when they are first opened. */
export const router = createBrowserRouter([
  {
    element: <Layout />,
    errorElement: <ErrorPage />,
    children: [
      {
        errorElement: <ErrorPage />,
        children: [
          { path: '/', element: <Navigate to="/desk" replace /> },
          { path: '/desk', element: <DeskPage /> },
          {
            path: '/bank',
            lazy: async () => ({ Component: (await import('./pages/BankPage.tsx')).BankPage }),
          },
          {
            path: '/items/:itemId',
            lazy: async () => ({ Component: (await import('./pages/BenchPage.tsx')).BenchPage }),
          },
          {
            path: '/reviews/:reviewId',
            lazy: async () => ({ Component: (await import('./pages/ReviewPage.tsx')).ReviewPage }),
          },
          {
            path: '/papers',
            lazy: async () => ({ Component: (await import('./pages/PapersPage.tsx')).PapersPage }),
          },
          {
            path: '/papers/:paperId',
            lazy: async () => ({ Component: (await import('./pages/PaperPage.tsx')).PaperPage }),
          },
          {
            path: '/people',
            lazy: async () => ({ Component: (await import('./pages/PeoplePage.tsx')).PeoplePage }),
          },
          {
            path: '/records',
            lazy: async () => ({ Component: (await import('./pages/RecordsPage.tsx')).RecordsPage }),
          },
          { path: '*', element: <NothingHere /> },
        ],
      },
    ],
  },
]);
