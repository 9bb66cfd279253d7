import type { ReactNode } from 'react';

/** The two halves: the night side and the page. `banner` stands above the page on every one of them. */
export function AppFrame({
  navigation,
  banner,
  footer,
  children,
}: {
  navigation: ReactNode;
  banner?: ReactNode;
  footer?: ReactNode;
  children: ReactNode;
}) {
  return (
    <div className="flex min-h-dvh flex-col md:flex-row">
      {navigation}
      <div className="flex min-w-0 flex-1 flex-col">
        {banner}
        <main
          id="main"
          tabIndex={-1}
          className="grid w-full max-w-330 content-start gap-4.5 px-4 py-5 outline-none md:px-7.5"
        >
          {children}
        </main>
        {footer}
      </div>
    </div>
  );
}
