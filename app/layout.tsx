import type { Metadata, Viewport } from "next";
import { cookies } from "next/headers";
import type { ReactNode } from "react";
import { Materials } from "@/components/line/materials";
import { themeCookie, themeOf } from "@/components/ui/theme";
import "@/app/globals.css";

export const metadata: Metadata = {
  title: { default: "Ropewalk", template: "%s · Ropewalk" },
  description: "A team's catalogue of coaxial and twisted-pair cables, and the runs built from them.",
};

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#f7f2e8" },
    { media: "(prefers-color-scheme: dark)", color: "#1c1916" },
  ],
};

/** Reading the cookie here makes every page dynamic, which the script nonce needs too; the theme is there with the first byte. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  const theme = themeOf((await cookies()).get(themeCookie)?.value);
  return (
    <html lang="en" data-theme={theme}>
      <body>
        <Materials />
        {children}
      </body>
    </html>
  );
}
