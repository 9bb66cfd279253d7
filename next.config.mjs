const everywhere = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  // A notebook is private, and a shared one is for whoever holds the link: no search engine, no other site learns of it.
  { key: 'Referrer-Policy', value: 'same-origin' },
  { key: 'X-Robots-Tag', value: 'noindex, nofollow' },
  {
    key: 'Permissions-Policy',
    value: 'camera=(), microphone=(), geolocation=(), payment=(), usb=(), browsing-topics=()',
  },
  { key: 'X-Frame-Options', value: 'DENY' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
];

// The API answers with data, never with a page: nothing in an answer may load or run. It is left out of
// proxy.ts, which would otherwise hold every uploaded body in memory and cut it at its own limit.
const api = [{ key: 'Content-Security-Policy', value: "default-src 'none'; frame-ancestors 'none'" }];

// The address of a share link is its secret: it is told to nobody, not even to our own pages.
const shared = [{ key: 'Referrer-Policy', value: 'no-referrer' }];

const secureOnly = [{ key: 'Strict-Transport-Security', value: 'max-age=31536000' }];

/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  // `next dev` must not write guide files of its own into the tree
  agentRules: false,
  // types are checked by `npm test`, tests included; a start must not wait for that
  typescript: { ignoreBuildErrors: true },
  // Sequelize requires every database driver by name; only the one we have exists
  serverExternalPackages: ['sequelize'],
  async headers() {
    return [
      { source: '/:path*', headers: everywhere },
      { source: '/api/:path*', headers: api },
      { source: '/s/:path*', headers: shared },
      {
        // Said only where the front server took https. A forged header on plain http is ignored by browsers.
        source: '/:path*',
        has: [{ type: 'header', key: 'x-forwarded-proto', value: 'https' }],
        headers: secureOnly,
      },
    ];
  },
};

export default config;
