import "@fontsource-variable/roboto/wght.css";
import "./globals.css";
import type { Metadata, Viewport } from "next";
import { connection } from "next/server";
import type { ReactNode } from "react";

export const metadata: Metadata = {
  title: "Holdground",
  description:
    "A register of a site's ground data and bearing values, and the footing checks that depend on it",
  applicationName: "Holdground",
  manifest: "/site.webmanifest",
  robots: { index: false, follow: false },
  formatDetection: { telephone: false, date: false, address: false, email: false },
};

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  colorScheme: "light dark",
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#f6f4ee" },
    { media: "(prefers-color-scheme: dark)", color: "#14181a" },
  ],
};

/** The paper that every page lies on. Made at each request: the content policy lets only scripts with its own nonce run. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  await connection();
  return (
    <html lang="en-GB">
      <body>{children}</body>
    </html>
  );
}
