'use client';

import { FailedWords, type FailedPage } from '@/components/register/page-failures';

export default function ErrorPage(failed: FailedPage) {
  return <FailedWords {...failed} />;
}
