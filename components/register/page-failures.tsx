import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { routes } from '@/lib/routes';

const LOOK = 'mx-auto max-w-xl py-10';

/** What stands where there is no page, or none for this person. */
export function NotFoundWords() {
  return (
    <div className={LOOK}>
      <h1 className="text-lg font-semibold">Not found</h1>
      <p className="mt-3">
        There is no such page, or it belongs to a site you have no access to. Nothing was changed.
      </p>
      <p className="mt-3">
        <Link className="link" href={routes.plantBook()}>
          Open the Plant book
        </Link>{' '}
        or press <kbd>/</kbd> on any page to find a machine.
      </p>
    </div>
  );
}

/** What stands where the role does not allow a page. */
export function ForbiddenWords() {
  return (
    <div className={LOOK}>
      <h1 className="text-lg font-semibold">Your role does not allow this</h1>
      <p className="mt-3">
        An administrator of the site can widen your role under Settings, People.
      </p>
      <p className="mt-3">
        <Link className="link" href={routes.today()}>
          Back to Today
        </Link>
      </p>
    </div>
  );
}

export type FailedPage = { error: Error & { digest?: string }; reset: () => void };

/** What stands where a page failed on the server. */
export function FailedWords({ error, reset }: FailedPage) {
  return (
    <div className={LOOK}>
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
    </div>
  );
}
