import type { ReactNode } from 'react';

type CautionProps = {
  /** The rule this caution comes from: “SAF-02”. */
  code?: string;
  /** One sentence, at most two. */
  children: ReactNode;
  /** `CheckField`: what the person confirms. */
  tick?: ReactNode;
  /** `Field`: who did it, by name. */
  name?: ReactNode;
};

/** A safety caution where the risk is: hatched edge, words, and what a person confirms by name. */
export function Caution({ code, children, tick, name }: CautionProps) {
  return (
    <div role="group" aria-label="Caution" className="flex rounded border border-ink bg-sheet">
      <span className="hatch w-3 shrink-0" aria-hidden="true" />
      <div className="flex min-w-0 flex-1 flex-col gap-2 px-4 py-3">
        <div className="flex items-start gap-2.5">
          <svg viewBox="0 0 20 18" className="mt-0.5 w-5 shrink-0" aria-hidden="true">
            <path d="M10 1 19 17H1Z" fill="none" stroke="currentColor" strokeWidth="1.8" />
            <path d="M10 6.5v5M10 13.2v1.8" stroke="currentColor" strokeWidth="1.8" />
          </svg>
          <div className="min-w-0 grow">
            {code !== undefined && (
              <span className="figures float-right ml-3 text-xs whitespace-nowrap text-ink-soft max-sm:float-none max-sm:ml-0 max-sm:block">
                {code}
              </span>
            )}
            <div className="text-base font-semibold">{children}</div>
          </div>
        </div>
        {tick}
        {name}
      </div>
    </div>
  );
}
