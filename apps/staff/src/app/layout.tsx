import "./globals.css";
import "./shell.css";
import type { Metadata, Viewport } from "next";
import { headers } from "next/headers";
import type { ReactNode } from "react";
import { Nonce } from "@/components/nonce";
import { ThemeScript } from "@/components/theme-script";

export const metadata: Metadata = {
  title: { default: "Withy", template: "%s: Withy" },
  description: "The day's book of a group of physiotherapy clinics.",
  robots: { index: false, follow: false },
  formatDetection: { telephone: false },
};

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#F6F2E7" },
    { media: "(prefers-color-scheme: dark)", color: "#171C1A" },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Reading the request makes every page dynamic: a prerendered page could carry no nonce.
  const nonce = (await headers()).get("x-nonce") ?? "";
  return (
    <html lang="en-GB" suppressHydrationWarning>
      <head>
        <ThemeScript nonce={nonce} />
      </head>
      <body>
        <Nonce value={nonce}>{children}</Nonce>
      </body>
    </html>
  );
}
