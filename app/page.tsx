import { redirect } from 'next/navigation';
import { laboratory } from '@/db/entry/settings';

/** The front door: to the notebooks, or to the set-up of a laboratory that is not there yet. */
export default async function HomePage() {
  redirect((await laboratory()) ? '/notebooks' : '/set-up');
}
