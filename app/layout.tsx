import '@fontsource-variable/ibm-plex-sans/wght.css';
import '@fontsource/ibm-plex-mono/400.css';
import '@fontsource/ibm-plex-mono/500.css';
import '@fontsource/ibm-plex-serif/500.css';
import './globals.css';

import type { Metadata, Viewport } from 'next';
import { cookies } from 'next/headers';
import { connection } from 'next/server';
import type { ReactNode } from 'react';

import { THEME_COOKIE, themeAttribute, themeFrom } from '@/components/frame/theme';
import { Toaster } from '@/components/ui/toaster';

export const metadata: Metadata = {
  title: { default: 'Halflight', template: '%s · Halflight' },
  description:
    'A notebook for concentrations measured by absorbance: spectra, standard curves, results with their uncertainty.',
  applicationName: 'Halflight',
  formatDetection: { telephone: false, date: false, address: false, email: false },
};

export const viewport: Viewport = {
  colorScheme: 'light dark',
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#1c1531' },
    { media: '(prefers-color-scheme: dark)', color: '#0d0919' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  // every page is rendered for its request: the script nonce in it is good for one answer only
  await connection();
  const theme = themeFrom((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <html lang="en" data-theme={themeAttribute(theme)}>
      <body>
        <a href="#main" className="skip-link">
          Skip to the content
        </a>
        {children}
        <Toaster />
      </body>
    </html>
  );
}
