import type { Metadata } from "next";
import localFont from "next/font/local";
import { cookies } from "next/headers";
import type { ReactNode } from "react";
import { readTheme, THEME_COOKIE } from "@/components/shell/theme";
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

export default async function RootLayout({ children }: { children: ReactNode }) {
  // The server writes the theme into the page, so that no wrong one flashes up first.
  const theme = readTheme((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <html
      lang="en"
      data-theme={theme}
      className={`${title.variable} ${interfaceFont.variable} ${number.variable}`}
    >
      <body>{children}</body>
    </html>
  );
}
