import type { Config } from 'tailwindcss';

/** The trade's own materials; yellow and orange are kept for cautions and used for nothing else. */
export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: {
        paper: '#f5f3ec',
        chalk: '#fffdf6',
        ink: '#1d242b',
        layout: { DEFAULT: '#173a5e', deep: '#0f2d4b', pale: '#c9d3dc' },
        oxide: { DEFAULT: '#9f3d2b', deep: '#85301f' },
        zinc: '#8a949b',
        soap: '#e6e8e3',
        line: '#cfd2cb',
        muted: '#566069',
        caution: '#f2b705',
      },
      fontFamily: {
        sans: ['Barlow', 'sans-serif'],
        head: ['"Barlow Condensed"', 'Barlow', 'sans-serif'],
        mono: ['"JetBrains Mono"', 'monospace'],
      },
    },
  },
} satisfies Config;
