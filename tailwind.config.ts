import type { Config } from 'tailwindcss';

/** A theme colour: its value stands in src/styles/tokens.css, once for each lamp setting. */
const token = (name: string) => `var(--color-${name})`;

/** The tokens of the look: paper and ink, one lit accent, brass and red lead for what needs care. */
export default {
  content: ['./src/**/*.{ts,tsx,html}'],
  theme: {
    extend: {
      colors: {
        paper: token('paper'),
        sheet: token('sheet'),
        ink: token('ink'),
        muted: token('muted'),
        rule: token('rule'),
        accent: token('accent'),
        'accent-text': token('accent-text'),
        brass: token('brass'),
        lead: token('lead'),
        slate: token('slate'),
      },
      fontFamily: {
        serif: ['"Literata Variable"', 'Literata', 'Georgia', 'serif'],
        mono: ['"Source Code Pro Variable"', '"Source Code Pro"', 'monospace'],
      },
    },
  },
} satisfies Config;
