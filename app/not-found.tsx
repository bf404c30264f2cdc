import Link from 'next/link';
import { routes } from '@/lib/routes';

export const metadata = { title: 'Not found' };

export default function NotFound() {
  return (
    <main className="mx-auto max-w-xl px-4 py-16">
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
    </main>
  );
}
