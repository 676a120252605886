import type { Metadata, Viewport } from 'next';
import { connection } from 'next/server';
import type { ReactNode } from 'react';
import { readsLargePrint } from '@/lib/web/cookies';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Garden railway open days', template: '%s' },
  applicationName: 'Leafhalt',
  icons: { icon: [{ url: '/icons/leafhalt.svg', type: 'image/svg+xml' }] },
  formatDetection: { telephone: false, date: false, address: false, email: false },
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  colorScheme: 'light dark',
  // The browser's own bar takes the colour of the sheet; a meta tag cannot read the tokens of globals.css.
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#fdfdf9' },
    { media: '(prefers-color-scheme: dark)', color: '#0f1f18' },
  ],
};

/** Every page's <html>: tied to the request (the nonce needs one), in large print for readers who asked for it. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  await connection();
  const isLarge = await readsLargePrint();
  return (
    <html lang="en" {...(isLarge ? { 'data-print': 'large' } : {})}>
      <body>
        <a
          href="#page"
          className="sr-only focus:not-sr-only focus:fixed focus:left-4 focus:top-4 focus:z-50 focus:bg-damson focus:px-5 focus:py-3 focus:font-semibold focus:text-on-damson print:hidden"
        >
          Skip to the page
        </a>
        {children}
      </body>
    </html>
  );
}
