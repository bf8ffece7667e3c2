import type { ReactNode } from 'react';

import { usePageTitle } from './use-page-title.ts';

interface PageProps {
  title: string;
  /** Whatever stands beside the title. */
  aside?: ReactNode;
  children: ReactNode;
}

/** A screen with its title, which is also the title of the window. */
export function Page({ title, aside, children }: PageProps) {
  usePageTitle(title);
  return (
    <>
      <div className="mb-5 flex flex-wrap items-baseline justify-between gap-4">
        <h1 className="text-2xl font-semibold">{title}</h1>
        {aside}
      </div>
      {children}
    </>
  );
}
