import type { Metadata, Viewport } from "next";
import localFont from "next/font/local";
import type { ReactNode } from "react";
import "./globals.css";

const commissioner = localFont({
  src: "../fonts/commissioner.woff2",
  weight: "100 900",
  display: "swap",
  variable: "--font-commissioner",
  fallback: ["Trebuchet MS", "Verdana", "sans-serif"],
});

const besley = localFont({
  src: [
    { path: "../fonts/besley-500.woff2", weight: "500", style: "normal" },
    { path: "../fonts/besley-600.woff2", weight: "600", style: "normal" },
    { path: "../fonts/besley-500i.woff2", weight: "500", style: "italic" },
  ],
  display: "swap",
  variable: "--font-besley",
  fallback: ["Rockwell", "Georgia", "serif"],
});

export const metadata: Metadata = {
  title: { default: "Ellwand", template: "%s · Ellwand" },
  description: "Quilt kits from the block drawing to the packed bag, and the shop that sells them.",
  manifest: "/manifest.webmanifest",
  icons: {
    icon: [
      { url: "/favicon.ico", sizes: "32x32" },
      { url: "/icon.svg", type: "image/svg+xml" },
    ],
    apple: "/apple-touch-icon.png",
  },
};

export const viewport: Viewport = { width: "device-width", initialScale: 1, themeColor: "#FCFCF9" };

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={`${commissioner.variable} ${besley.variable}`}>
      <body>{children}</body>
    </html>
  );
}
