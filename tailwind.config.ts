import type { Config } from "tailwindcss";

/** Where class names are looked for. Colours, sizes and spacing are tokens: app/tokens.css and app/theme.css. */
const config: Config = {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
};

export default config;
