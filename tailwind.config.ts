import type { Config } from 'tailwindcss';

const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: {
        chalk: 'var(--chalk)',
        paper: 'var(--paper)',
        iron: 'var(--iron)',
        soft: 'var(--soft)',
        line: 'var(--line)',
        blue: 'var(--blue)',
        'on-blue': 'var(--on-blue)',
        amber: 'var(--amber)',
        'amber-ground': 'var(--amber-ground)',
        'on-amber': 'var(--on-amber)',
        red: 'var(--red)',
        green: 'var(--green)',
      },
      fontFamily: {
        figures: ['var(--font-barlow)', 'Arial Narrow', 'sans-serif'],
        reading: ['var(--font-atkinson)', 'Verdana', 'sans-serif'],
      },
      borderRadius: { plate: '6px' },
    },
  },
};
export default config;
