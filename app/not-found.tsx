import { NotFoundWords } from '@/components/register/page-failures';

export const metadata = { title: 'Not found' };

export default function NotFound() {
  return (
    <main className="px-4">
      <NotFoundWords />
    </main>
  );
}
