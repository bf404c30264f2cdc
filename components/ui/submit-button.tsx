'use client';

import type { ComponentProps, MouseEvent } from 'react';
import { useFormStatus } from 'react-dom';
import { Button } from './button';

/** Sends the form it stands in; stays enabled, and ignores a second tap while the first is on its way. */
export function SubmitButton({ variant = 'primary', ...rest }: ComponentProps<typeof Button>) {
  const { pending } = useFormStatus();
  const ignoreSecondTap = (event: MouseEvent<HTMLButtonElement>) => {
    if (pending) event.preventDefault();
  };
  return (
    <Button
      onClick={ignoreSecondTap}
      {...rest}
      type="submit"
      variant={variant}
      pending={pending}
      aria-disabled={pending || undefined}
    />
  );
}
