import { Card } from '@/components/ui/card';
import { Columns } from '@/components/ui/columns';
import { readingRuleWords } from '@/lib/curve/reading-rule-words';
import { standardRows } from '@/lib/curve/standard-rows';
import { allLimits, compareModels } from '@/lib/engine';
import type { CurveView } from '@/lib/views/curve';
import { CurveFacts } from './curve-facts';
import { CurveJudgements } from './curve-judgements';
import { CurvePlots } from './curve-plots';
import { CurveStatusNotice, HazardNote } from './curve-status';
import { LimitsRuler } from './limits-ruler';
import { MethodFacts } from './method-facts';
import { ModelTable } from './model-table';
import { StandardsTable } from './standards-table';
import { VersionTable } from './version-table';

/** How the readings came, for the line beside the title of the standards. */
function originWords({ standards, method }: CurveView): string {
  const readings = standards.flatMap((standard) => standard.readings);
  const spectra = readings.filter(({ origin }) => origin === 'spectrum').length;
  const from =
    spectra === 0
      ? 'typed'
      : spectra === readings.length
        ? `from spectra, ${readingRuleWords(method.readingRule)}`
        : 'typed and from spectra';
  return `${readings.length} readings, ${from}`;
}

/** Everything of a saved curve under its title. */
export function CurveDetail({ curve, timeZone }: { curve: CurveView; timeZone: string }) {
  const { method, standards, result } = curve;
  const spectrumHref = (id: string) => `/notebooks/${curve.notebookId}/spectra/${id}`;
  return (
    <div className="grid gap-4.5">
      <CurveStatusNotice curve={curve} />
      <HazardNote note={method.hazardNote} />
      <CurveFacts curve={result.curve} />
      <Columns share="even">
        <div className="grid min-w-0 gap-4.5">
          <Card flush title="Standards" aside={originWords(curve)}>
            <StandardsTable
              rows={standardRows(standards, result.curve)}
              unit={method.unit}
              spectrumHref={spectrumHref}
            />
          </Card>
          <CurveJudgements curve={result.curve} />
        </div>
        <div className="grid min-w-0 gap-4.5">
          <CurvePlots standards={standards} curve={result.curve} />
          <MethodFacts curve={curve} />
        </div>
      </Columns>
      <Card flush title="Limits on one ruler" aside="in the measured solution">
        <LimitsRuler {...allLimits({ unit: method.unit, curve: curve.request })} range={result.curve.range} />
      </Card>
      <Card flush title="Models side by side" aside="a batch shows them by its own results">
        <ModelTable models={compareModels(curve.request)} unit={method.unit} />
      </Card>
      <VersionTable
        label="Versions of this curve"
        versions={curve.versions}
        shownId={curve.id}
        base={`/notebooks/${curve.notebookId}/curves`}
        timeZone={timeZone}
      />
    </div>
  );
}
