import type { Config } from 'tailwindcss'

const colors = [
  'enamel', 'plate', 'recess', 'ink', 'ink-2', 'ink-3', 'edge', 'rule', 'on-ink', 'glow', 'glow-wash', 'on-glow',
  'rust', 'rust-wash', 'lit', 'hatch', 'hot-core', 'hot-case', 'on-hot', 'leg2-core', 'leg2-case', 'neutral-core',
  'neutral-case', 'on-neutral', 'ground-core', 'ground-case', 'brown-core', 'blue-core', 'z-danger', 'z-warning',
  'z-caution', 'z-notice', 'z-on-danger', 'z-on-warning', 'z-on-caution', 'z-on-notice',
]

/**
 * Names for the tokens of `src/tokens.css`. Colors point at the custom properties, so a theme switches without
 * `dark:` classes. Widths have their own names (`fine`, not `edge`), since `border-edge` is the color.
 */
export default {
  content: [],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ...Object.fromEntries(colors.map((name) => [name, `var(--${name})`])),
    },
    fontFamily: { sans: ['Noto Sans', 'system-ui', 'sans-serif'] },
    fontSize: {
      note: ['0.8125rem', '1.45'],
      small: ['0.9375rem', '1.45'],
      body: ['1.0625rem', '1.5'],
      lead: ['1.25rem', '1.42'],
      head: ['1.5rem', '1.22'],
      title: ['2rem', '1.22'],
      reading: ['2.25rem', '1.1'],
      verdict: ['3.5rem', '1'],
    },
    spacing: {
      0: '0',
      px: '1px',
      1: '4px',
      2: '8px',
      3: '12px',
      4: '16px',
      5: '24px',
      6: '32px',
      7: '48px',
      8: '72px',
      floor: '44px',
      touch: '48px',
      glove: '60px',
      key: '64px',
    },
    borderRadius: { none: '0', plate: '2px', control: '4px', node: '999px' },
    borderWidth: { DEFAULT: '1px', 0: '0', hair: '1px', fine: '1.5px', rail: '2px', chosen: '3px' },
    screens: { tablet: '701px', desk: '1101px' },
    transitionDuration: { quick: '120ms', land: '240ms' },
    transitionTimingFunction: { land: 'cubic-bezier(.2,.7,.2,1)' },
    extend: { maxWidth: { page: '1240px', text: '68ch' } },
  },
} satisfies Config
