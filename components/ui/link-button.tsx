import Link from 'next/link';
import type { ComponentProps } from 'react';
import { buttonLook, type ButtonVariant } from './button-look';

type LinkButtonProps = ComponentProps<typeof Link> & { variant?: ButtonVariant };

/** A link to the next step that looks like a button. */
export function LinkButton({ variant = 'secondary', className, ...rest }: LinkButtonProps) {
  return <Link {...rest} className={buttonLook(variant, className)} />;
}
