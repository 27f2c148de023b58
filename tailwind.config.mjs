/* Tailwind speaks the tokens of src/styles/tokens.css and nothing else. */
import theme from './src/styles/tailwind.theme.json' with { type: 'json' };

/** @type {import('tailwindcss').Config} */
export default {
  content: ['./src/**/*.{astro,tsx,ts}'],
  corePlugins: { preflight: false },
  ...theme,
};
