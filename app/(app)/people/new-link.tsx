import { ShownOnce } from '@/components/account/shown-once';

/** The link just made, to be handed to the person it is for. */
export function NewLink({ link }: { link: string }) {
  return (
    <ShownOnce text={link} label="Link to set a password" copyLabel="Copy the link">
      Copy this link now and hand it over: it is shown this once. With it they set a password and are signed
      in. It is good for 48 hours and works once.
    </ShownOnce>
  );
}
