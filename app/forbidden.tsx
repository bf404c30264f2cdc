import { ForbiddenWords } from '@/components/register/page-failures';

export const metadata = { title: 'Not permitted' };

export default function Forbidden() {
  return (
    <main className="px-4">
      <ForbiddenWords />
    </main>
  );
}
