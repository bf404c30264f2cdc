'use client';

import { Button } from '@/components/ui/button';

export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <main className="mx-auto max-w-xl px-4 py-16">
      <h1 className="text-lg font-semibold">This page could not be shown</h1>
      <p className="mt-3">
        Something failed on the server; what was saved before is safe. Try once more. If it fails
        again, tell your administrator
        {error.digest ? (
          <>
            {' '}
            and name <span className="figures">{error.digest}</span>
          </>
        ) : null}
        .
      </p>
      <div className="mt-4">
        <Button variant="primary" onClick={reset}>
          Try once more
        </Button>
      </div>
    </main>
  );
}
