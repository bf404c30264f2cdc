'use client';

import { Button } from '@/components/ui/button';

/** Opens the browser's print dialog; the page prints on A4 and Letter without the navigation. */
export function PrintButton() {
  return <Button onClick={() => window.print()}>Print</Button>;
}
