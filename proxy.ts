import { randomBytes } from 'node:crypto';
import { NextResponse, type NextRequest } from 'next/server';

/**
 * What a page may load. Scripts run by a nonce that is new for every answer. Styles keep 'unsafe-inline': plots
 * and toasts set style attributes and style elements that carry no nonce, and without it they lose their layout.
 */
function contentSecurityPolicy(nonce: string): string {
  // React's development build rebuilds server stacks with eval; the production build does not
  const development = process.env.NODE_ENV === 'development' ? " 'unsafe-eval'" : '';
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'self'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

/** Gives every page its policy; Next reads the nonce from the request's copy and puts it on its own scripts. */
export function proxy(request: NextRequest) {
  const policy = contentSecurityPolicy(randomBytes(16).toString('base64'));
  const headers = new Headers(request.headers);
  headers.set('Content-Security-Policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  return response;
}

// Pages only. The other headers, and those of the API and its upload route, come from next.config.mjs.
export const config = {
  matcher: [
    {
      source: '/((?!api/|_next/static|_next/image|icon.svg|favicon.ico).*)',
      missing: [
        { type: 'header', key: 'next-router-prefetch' },
        { type: 'header', key: 'purpose', value: 'prefetch' },
      ],
    },
  ],
};
