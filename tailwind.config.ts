import type { Config } from 'tailwindcss';

const token = (name: string) => `rgb(var(--${name}) / <alpha-value>)`;

/** Design tokens. The values for light and dark stand in app/globals.css. */
export default {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: token('paper'),
      sheet: token('sheet'),
      ink: { DEFAULT: token('ink'), soft: token('ink-soft') },
      rule: token('rule'),
      edge: token('edge'),
      fault: token('fault'),
      disc: token('disc'),
      scribe: token('scribe'),
      blue: { DEFAULT: token('blue'), wash: token('blue-wash'), on: token('blue-on') },
      brass: { DEFAULT: token('brass'), line: token('brass-line') },
      zone: {
        a: token('zone-a'),
        b: token('zone-b'),
        c: token('zone-c'),
        d: token('zone-d'),
        'a-on': token('zone-a-on'),
        'b-on': token('zone-b-on'),
        'c-on': token('zone-c-on'),
        'd-on': token('zone-d-on'),
      },
    },
    fontSize: {
      xs: ['0.75rem', '1rem'],
      sm: ['0.875rem', '1.25rem'],
      base: ['1rem', '1.5rem'],
      lg: ['1.25rem', '1.75rem'],
      xl: ['1.75rem', '2.25rem'],
    },
    borderRadius: { none: '0', DEFAULT: '2px', full: '9999px' },
    extend: {
      fontFamily: {
        sans: ['var(--font-words)', 'system-ui', 'sans-serif'],
        mono: ['var(--font-figures)', 'ui-monospace', 'monospace'],
      },
    },
  },
} satisfies Config;
