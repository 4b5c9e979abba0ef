import type { Metadata } from "next";
import localFont from "next/font/local";
import type { ReactNode } from "react";
import "./globals.css";

const title = localFont({
  src: "../node_modules/@fontsource-variable/newsreader/files/newsreader-latin-wght-normal.woff2",
  weight: "200 800",
  variable: "--font-title",
});
const interfaceFont = localFont({
  src: "../node_modules/@fontsource-variable/hanken-grotesk/files/hanken-grotesk-latin-wght-normal.woff2",
  weight: "100 900",
  variable: "--font-interface",
});
const number = localFont({
  src: "../node_modules/@fontsource-variable/spline-sans-mono/files/spline-sans-mono-latin-wght-normal.woff2",
  weight: "300 700",
  variable: "--font-number",
});

export const metadata: Metadata = {
  title: { default: "Neap", template: "%s · Neap" },
  description: "Bench emission sweeps held against emission masks.",
};

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={`${title.variable} ${interfaceFont.variable} ${number.variable}`}>
      <body>{children}</body>
    </html>
  );
}
