import type { ReactNode } from 'react';
import { BrandMark, Wordmark } from '../../../components/ui/brand-mark.tsx';
import { PageHeading } from '../../../components/ui/page.tsx';
import { useArrival } from '../../../hooks/use-arrival.ts';

/** The frame of pages in front of the sign-in: one narrow column. */
export function Door({ title, headline, children }: { title: string; headline?: string; children: ReactNode }) {
  useArrival();
  return (
    <main className="mx-auto grid min-h-screen w-full max-w-md content-start gap-5 px-4 py-10">
      <p className="flex items-center gap-2">
        <BrandMark />
        <Wordmark />
      </p>
      <PageHeading title={title} headline={headline} />
      {children}
    </main>
  );
}
