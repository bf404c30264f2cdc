export type ButtonVariant = 'primary' | 'secondary' | 'quiet' | 'danger';

const BASE =
  'target inline-flex items-center justify-center gap-2 rounded border px-4 py-1.5 text-sm font-semibold transition-colors duration-100 cursor-pointer aria-disabled:cursor-default aria-disabled:opacity-60 disabled:cursor-default disabled:opacity-60';

const LOOKS: Readonly<Record<ButtonVariant, string>> = {
  primary: 'border-blue bg-blue text-blue-on hover:bg-blue/90',
  secondary: 'border-blue bg-sheet text-blue hover:bg-blue-wash',
  quiet: 'border-transparent bg-transparent text-blue hover:bg-blue-wash',
  danger: 'border-fault bg-sheet text-fault hover:bg-fault/10',
};

/** The look that buttons and links which act as buttons share. */
export function buttonLook(variant: ButtonVariant, className = ''): string {
  return `${BASE} ${LOOKS[variant]} ${className}`;
}
