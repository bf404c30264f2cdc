'use client';

import { FailedWords, type FailedPage } from '@/components/register/page-failures';

export default function ErrorPage(failed: FailedPage) {
  return (
    <main className="px-4">
      <FailedWords {...failed} />
    </main>
  );
}
