import type { ReactNode } from 'react';

import { classNames } from './class-names';

export type Tone = 'order' | 'decide' | 'stop' | 'note' | 'plain';

const TONES: Record<Tone, { colour: string; wash: string; shape: string }> = {
  order: {
    colour: 'text-verdigris',
    wash: 'bg-verdigris-wash',
    shape: 'M6 1.5a4.5 4.5 0 1 1 0 9a4.5 4.5 0 0 1 0-9',
  },
  decide: { colour: 'text-amber', wash: 'bg-amber-wash', shape: 'M6 .8 11.2 6 6 11.2.8 6z' },
  stop: { colour: 'text-red', wash: 'bg-red-wash', shape: 'M6 1 11.5 10.7H.5z' },
  note: { colour: 'text-uv', wash: 'bg-uv-wash', shape: 'M1.8 1.8h8.4v8.4H1.8z' },
  plain: { colour: 'text-ink-2', wash: 'bg-raised', shape: 'M1 5h10v2H1z' },
};

/** The shape that goes with a tone, so that a colour never speaks alone. */
export function ToneShape({ tone, className }: { tone: Tone; className?: string }) {
  const { colour, shape } = TONES[tone];
  return (
    <svg
      viewBox="0 0 12 12"
      aria-hidden="true"
      className={classNames('size-2.5 shrink-0', colour, className)}
    >
      <path d={shape} fill="currentColor" />
    </svg>
  );
}

/** A word or a sentence with its shape and colour. `quiet` leaves out the wash, for what is in order. */
export function Pill({
  tone = 'plain',
  quiet = false,
  code,
  children,
  className,
}: {
  tone?: Tone;
  quiet?: boolean;
  /** a short code, set small behind the words */
  code?: string;
  children: ReactNode;
  className?: string;
}) {
  const { colour, wash } = TONES[tone];
  return (
    <span
      className={classNames(
        'inline-flex items-baseline gap-1.5 rounded-[6px] py-0.5 text-left text-[0.78125rem] leading-snug font-medium',
        colour,
        !quiet && `${wash} px-2`,
        className,
      )}
    >
      <ToneShape tone={tone} />
      <span>
        {children}
        {code && <span className="num ml-1.5 text-[0.6875rem] font-normal">{code}</span>}
      </span>
    </span>
  );
}
