import { Pill } from '@/components/ui/pill';
import type { PersonView } from '@/lib/views/person';

/** Where an account stands, in a word or two. */
export function PersonState({ person }: { person: PersonView }) {
  if (!person.active) return <Pill tone="plain">closed</Pill>;
  if (person.hasPassword)
    return (
      <Pill tone="order" quiet>
        active
      </Pill>
    );
  return <Pill tone="decide">{person.openLink ? 'invited' : 'has no password and no link'}</Pill>;
}
