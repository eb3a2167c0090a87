import path from "node:path";

const root = path.resolve(import.meta.dirname);

/** The policy with its nonce is set for each page by proxy.ts; these go with every answer. */
const securityHeaders = [
  { key: "X-Content-Type-Options", value: "nosniff" },
  { key: "Referrer-Policy", value: "same-origin" },
  // The camera reads tags, and the cutting table keeps its screen awake.
  { key: "Permissions-Policy", value: "camera=(self), screen-wake-lock=(self), microphone=(), geolocation=(), payment=(), usb=(), browsing-topics=()" },
  { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
];

/** @type {import("next").NextConfig} */
const config = {
  distDir: process.env.NEXT_DIST_DIR || ".next",
  poweredByHeader: false,
  reactStrictMode: true,
  turbopack: { root },
  // These load files or native code at run time, or lose their names when they are minified.
  serverExternalPackages: ["sequelize", "pg", "pdfkit", "bwip-js", "highs", "sharp", "@node-rs/argon2", "nodemailer"],
  experimental: { authInterrupts: true, serverActions: { bodySizeLimit: "2mb" } },
  async headers() {
    return [
      { source: "/:path*", headers: securityHeaders },
      // PDFs and other answers of the API are framed by the print page, and by nobody else.
      { source: "/api/:path*", headers: [{ key: "Content-Security-Policy", value: "frame-ancestors 'self'" }] },
    ];
  },
};

export default config;
