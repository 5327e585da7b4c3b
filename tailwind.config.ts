import type { Config } from 'tailwindcss'

// Tokens live in src/app.css as custom properties (two themes); these names let utility classes use them.
const token = (name: string) => `var(--${name})`
const colours = [
  'paper', 'field', 'shallow', 'shallow-2', 'land', 'ink', 'ink-2', 'ink-3', 'line', 'hair', 'contour', 'shore',
  'depth', 'on-ink', 'magenta', 'magenta-wash', 'on-magenta', 'q', 'q-wash', 'on-q', 'green', 'green-wash', 'on-green',
]

export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    colors: { transparent: 'transparent', current: 'currentColor', ...Object.fromEntries(colours.map((c) => [c, token(c)])) },
    extend: { borderRadius: { DEFAULT: token('radius'), touch: token('radius-touch') } },
  },
} satisfies Config
