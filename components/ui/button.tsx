import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { buttonLook, type ButtonVariant } from './button-look';
import { Spinner } from './spinner';

type ButtonProps = ButtonHTMLAttributes<HTMLButtonElement> & {
  variant?: ButtonVariant;
  pending?: boolean;
  children: ReactNode;
};

/** A button; while pending it keeps its label and adds a spinner. */
export function Button({
  variant = 'secondary',
  pending = false,
  className,
  children,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      className={buttonLook(variant, className)}
      aria-busy={pending || undefined}
    >
      {pending && <Spinner />}
      {children}
    </button>
  );
}
