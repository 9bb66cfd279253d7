import type { Metadata } from 'next';
import { CautionList } from '@/components/cautions/caution-list';
import { LinkButton } from '@/components/ui/button';
import { CAUTIONS } from '@/lib/cautions';
import { PublicPage } from '@/app/(public)/public-page';

export const metadata: Metadata = { title: 'Cautions' };

export default function CautionsPage() {
  return (
    <PublicPage title="Cautions" width="text">
      <p className="text-ink-2">What Halflight is not, and what comes before it.</p>
      <CautionList cautions={CAUTIONS} />
      <div>
        <LinkButton href="/">Back to the notebooks</LinkButton>
      </div>
    </PublicPage>
  );
}
