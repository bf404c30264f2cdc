import type { Metadata } from 'next';
import { StyleSheet } from '@/components/register/style-sheet';
import { requireActor } from '@/lib/server/actor';

export const metadata: Metadata = { title: 'Style sheet' };

export default async function StyleSheetPage() {
  await requireActor();
  return <StyleSheet />;
}
