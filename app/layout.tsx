import type { Metadata, Viewport } from "next";
import { cookies, headers } from "next/headers";
import { connection } from "next/server";
import type { CSSProperties, ReactNode } from "react";
import { DemonstrationLine } from "@/components/site/DemonstrationLine";
import tokens from "@/components/ui/tokens.json";
import { fontVariables } from "./fonts";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Lagmark", template: "%s · Lagmark" },
  description:
    "Practical checks for people who install, commission and maintain satellite-navigation receivers, and certificates that anyone can verify.",
  icons: { icon: "/icon.svg" },
};

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: tokens.color.light.sheet },
    { media: "(prefers-color-scheme: dark)", color: tokens.color.dark.sheet },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  // A page built ahead of time would carry no nonce, and the policy of proxy.ts would then stop its scripts.
  await connection();
  const demonstrating = Boolean(process.env.DEMONSTRATION);
  const nonce = (await headers()).get("x-nonce") ?? undefined;
  return (
    <html lang="en" data-theme={await chosenTheme()} className={fontVariables}>
      <head>
        {/* Component libraries that add style elements read their nonce here. */}
        <meta property="csp-nonce" content={nonce} />
      </head>
      <body className="flex flex-col" style={demonstrating ? BELOW_THE_LINE : undefined}>
        <a href="#content" className="skip-link">
          Skip to content
        </a>
        {demonstrating && <DemonstrationLine mailAddress={process.env.DEMONSTRATION_MAIL_URL} />}
        {children}
      </body>
    </html>
  );
}

/** Pages that fill the window leave room for the demonstration's line. */
const BELOW_THE_LINE = { "--banner": "27px" } as CSSProperties;

async function chosenTheme(): Promise<"light" | "dark" | undefined> {
  const theme = (await cookies()).get("theme")?.value;
  return theme === "light" || theme === "dark" ? theme : undefined;
}
