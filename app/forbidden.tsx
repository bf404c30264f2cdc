import Link from 'next/link';
import { routes } from '@/lib/routes';

export const metadata = { title: 'Not permitted' };

export default function Forbidden() {
  return (
    <main className="mx-auto max-w-xl px-4 py-16">
      <h1 className="text-lg font-semibold">Your role does not allow this</h1>
      <p className="mt-3">
        An administrator of the site can widen your role under Settings, People.
      </p>
      <p className="mt-3">
        <Link className="link" href={routes.today()}>
          Back to Today
        </Link>
      </p>
    </main>
  );
}
