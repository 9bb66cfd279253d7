import { LinkButton } from '@/components/ui/button';
import type { NotebookProgress } from '@/lib/views/notebook';

interface Step {
  readonly words: string;
  readonly href: string;
  readonly label: string;
  /** Another way to go on, where there is one. */
  readonly or?: { readonly href: string; readonly label: string };
}

/** Where the work stands, in a sentence, and the one next step for somebody who works in the notebook. */
export function nextStep(base: string, progress: NotebookProgress): Step {
  const { spectra, curves, absorptivities, batches, determinations, newestCurveTitle, newestBatchId } =
    progress;
  if (curves + absorptivities === 0)
    return spectra === 0
      ? {
          words:
            'Nothing has been measured yet. Upload spectra first, or type the readings of your standards into a curve.',
          href: `${base}/spectra`,
          label: 'Upload spectra',
          or: { href: `${base}/curves/new`, label: 'Type readings into a curve' },
        }
      : {
          words: `${count(spectra, 'spectrum', 'spectra')} uploaded, and no standard curve yet.`,
          href: `${base}/curves/new`,
          label: 'Build a standard curve',
        };
  if (batches === 0)
    return {
      words:
        curves > 0
          ? `The curve “${newestCurveTitle}” is saved. No sample has been read off it yet.`
          : 'A known absorptivity is saved. No sample has been read by it yet.',
      href: `${base}/batches/new`,
      label: 'Start a batch',
    };
  if (determinations === 0)
    return {
      words: 'A batch is open and holds no sample yet.',
      href: `${base}/batches/${newestBatchId}`,
      label: 'Add samples',
    };
  return {
    words: `${count(determinations, 'determination', 'determinations')} in ${count(batches, 'batch', 'batches')}, read ${readBy(progress)}.`,
    href: `${base}/batches/${newestBatchId}`,
    label: 'Open the newest batch',
  };
}

/** What the determinations of a notebook rest on. */
function readBy({ curves, absorptivities }: NotebookProgress): string {
  const off = `off ${count(curves, 'standard curve', 'standard curves')}`;
  if (absorptivities === 0) return off;
  const by = `by ${count(absorptivities, 'known absorptivity', 'known absorptivities')}`;
  return curves === 0 ? by : `${off} and ${by}`;
}

const count = (n: number, singular: string, plural: string) => `${n} ${n === 1 ? singular : plural}`;

export function NextStep({
  base,
  progress,
  mayEdit,
}: {
  base: string;
  progress: NotebookProgress;
  mayEdit: boolean;
}) {
  const step = nextStep(base, progress);
  const worthReading = progress.determinations > 0;
  return (
    <div className="grid justify-items-start gap-3">
      <p className="max-w-prose font-serif text-fact">{step.words}</p>
      {(mayEdit || worthReading) && (
        <div className="flex flex-wrap gap-3">
          <LinkButton href={step.href} variant="primary">
            {step.label}
          </LinkButton>
          {mayEdit && step.or && <LinkButton href={step.or.href}>{step.or.label}</LinkButton>}
        </div>
      )}
    </div>
  );
}
