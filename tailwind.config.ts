import type { Config } from 'tailwindcss';
import plugin from 'tailwindcss/plugin';

type Tokens = { [name: string]: string | Tokens };

/** Each colour as a custom property too, for what is no utility: `colors.shank.dusk` is `--color-shank-dusk`. */
const asProperties = (tokens: Tokens, before: string): Record<string, string> =>
  Object.fromEntries(
    Object.entries(tokens).flatMap(([name, value]) => {
      const own = name === 'DEFAULT' ? before : `${before}-${name}`;
      return typeof value === 'string' ? [[own, value]] : Object.entries(asProperties(value, own));
    }),
  );

const COLOURS = {
  mud: '#F5F3EC',
  sheet: '#FFFFFF',
  ink: '#1D2521',
  soft: '#56605A',
  rule: '#D8D4C7',
  edge: '#7C827A',
  shank: { DEFAULT: '#B83A14', pale: '#F8E3DA', dusk: '#FF8A5E' },
  tide: { DEFAULT: '#17616E', pale: '#DCEBED', dusk: '#6CC6D4' },
  reed: { DEFAULT: '#566321', pale: '#E8ECD0', dusk: '#BFCB7A' },
  ochre: { DEFAULT: '#7D5200', pale: '#F6E7C6' },
  alarm: { DEFAULT: '#8E1B2E', pale: '#F6DDE0' },
  dusk: {
    DEFAULT: '#1B211F',
    2: '#262E2B',
    rule: '#3A4440',
    edge: '#6C7872',
    ink: '#EDEBE2',
    soft: '#A7B0AA',
  },
};

/**
 * The tokens of the product. Vermilion (shank) and teal (tide) mean support side and lifted side and nothing
 * else; reed is expected or done, ochre caution or waiting, alarm refused or destructive.
 */
export default {
  content: ['./*.html', './src/**/*.{ts,tsx}'],
  theme: {
    // up to 900 one column · tablet: margin follows its matter · desk: three columns · full: their full widths
    screens: { phone: '480px', tablet: '901px', desk: '1280px', full: '1344px' },
    colors: {
      ...COLOURS,
      transparent: 'transparent',
      current: 'currentColor',
    },
    fontFamily: { sans: ['"Source Sans 3"', 'system-ui', 'sans-serif'] },
    fontSize: {
      caption: ['14px', '20px'],
      note: ['15px', '22px'],
      body: ['16px', '24px'],
      sub: ['18px', '24px'],
      lead: ['20px', '30px'],
      filled: ['26px', '32px'],
      value: ['36px', '44px'],
      'title-narrow': ['34px', '40px'],
      title: ['40px', '44px'],
      reading: ['56px', '60px'],
    },
    fontWeight: { light: '300', normal: '400', bold: '600' },
    borderRadius: { none: '0', DEFAULT: '4px', full: '9999px' },
    extend: {
      maxWidth: { page: '1344px', lead: '38em', form: '700px' },
      // the one thing that moves: the landmark or the frame that is asked for next
      keyframes: { breathe: { '50%': { opacity: '0.45' } } },
      animation: { breathe: 'breathe 1.8s ease-in-out infinite' },
    },
  },
  plugins: [plugin((api) => api.addBase({ ':root': asProperties(COLOURS, '--color') }))],
} satisfies Config;
