import Link from 'next/link';
import type { ComponentProps } from 'react';

import { classNames } from './class-names';

export type ButtonVariant = 'primary' | 'secondary' | 'quiet' | 'danger';
export type ButtonSize = 'normal' | 'small';

const SHAPE =
  'inline-flex items-center justify-center gap-2 rounded-control border font-medium whitespace-nowrap select-none no-underline ' +
  'transition-colors disabled:cursor-not-allowed disabled:opacity-60 aria-disabled:cursor-not-allowed aria-disabled:opacity-60';

const SIZES: Record<ButtonSize, string> = {
  normal: 'min-h-9 px-3.5 py-1.5 text-[0.84375rem]',
  small: 'min-h-7 px-2.5 py-0.5 text-sm',
};

const VARIANTS: Record<ButtonVariant, string> = {
  primary:
    'border-uv bg-uv text-on-uv enabled:hover:border-uv-deep enabled:hover:bg-uv-deep [a&]:hover:border-uv-deep [a&]:hover:bg-uv-deep',
  secondary: 'border-control bg-sheet text-ink enabled:hover:bg-raised [a&]:hover:bg-raised',
  quiet: 'border-transparent bg-transparent text-uv enabled:hover:bg-uv-wash [a&]:hover:bg-uv-wash',
  danger: 'border-red bg-sheet text-red enabled:hover:bg-red-wash [a&]:hover:bg-red-wash',
};

interface Look {
  variant?: ButtonVariant;
  size?: ButtonSize;
}

function look({ variant = 'secondary', size = 'normal' }: Look, extra?: string): string {
  return classNames(SHAPE, SIZES[size], VARIANTS[variant], extra);
}

/** A button. With `onClick` it acts where it stands; without, and with no `type`, it sends its form. */
export function Button({ variant, size, className, type, ...rest }: ComponentProps<'button'> & Look) {
  const kind = type ?? (rest.onClick ? 'button' : 'submit');
  return <button type={kind} className={look({ variant, size }, className)} {...rest} />;
}

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function LinkButton({ variant, size, className, ...rest }: ComponentProps<typeof Link> & Look) {
  return <Link className={look({ variant, size }, className)} {...rest} />;
}

/** A plain <a> in the same dress, for downloads and addresses outside the pages. */
export function DownloadButton({ variant, size, className, ...rest }: ComponentProps<'a'> & Look) {
  return <a className={look({ variant, size }, className)} {...rest} />;
}
