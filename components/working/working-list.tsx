import { Table, Td, Th } from '@/components/ui/table';
import type { WorkingStep } from '@/lib/engine';
import { withTrueMinus } from '@/lib/format/number';
import { significantText } from '@/lib/format/round';

/** Digits of a value in the working: enough to follow the calculation by hand. */
const DIGITS = 7;

function valueText(value: WorkingStep['value']): string {
  return typeof value === 'string' ? value : withTrueMinus(significantText(value, DIGITS));
}

function Inputs({
  step,
  known,
  prefix,
}: {
  step: WorkingStep;
  known: ReadonlyMap<string, WorkingStep>;
  prefix: string;
}) {
  const inputs = step.inputs.flatMap((id) => known.get(id) ?? []);
  if (inputs.length === 0) return null;
  const few = inputs.length <= 6 ? inputs : [...inputs.slice(0, 3), ...inputs.slice(-1)];
  return (
    <p className="text-xs text-ink-2">
      from{' '}
      {few.map((input, index) => (
        <span key={input.id}>
          {index > 0 && (inputs.length > few.length && index === few.length - 1 ? ' … ' : ', ')}
          <a href={`#${prefix}-${input.id}`} className="text-uv underline-offset-2 hover:underline">
            {input.label}
          </a>
        </span>
      ))}
    </p>
  );
}

function Derived({
  step,
  known,
  prefix,
}: {
  step: WorkingStep;
  known: ReadonlyMap<string, WorkingStep>;
  prefix: string;
}) {
  return (
    <li
      id={`${prefix}-${step.id}`}
      className="scroll-mt-6 border-b px-4 py-2.5 last:border-b-0 target:bg-uv-wash"
    >
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h4 className="font-medium">{step.label}</h4>
        <p className="num font-medium">
          {step.symbol} = {valueText(step.value)} <span className="aside font-sans text-sm">{step.unit}</span>
        </p>
      </div>
      <p className="num mt-1 text-[0.8125rem] [overflow-wrap:anywhere]">{step.formula}</p>
      <p className="num text-[0.8125rem] text-ink-2 [overflow-wrap:anywhere]">{step.substituted}</p>
      <div className="mt-1 flex flex-wrap justify-between gap-x-4">
        <Inputs step={step} known={known} prefix={prefix} />
        <p className="text-xs text-ink-2">{step.source}</p>
      </div>
    </li>
  );
}

function Given({ steps, prefix }: { steps: readonly WorkingStep[]; prefix: string }) {
  return (
    <Table label="What was given">
      <thead>
        <tr>
          <Th>What was given</Th>
          <Th>Symbol</Th>
          <Th numeric>Value</Th>
          <Th>Unit</Th>
          <Th>From</Th>
        </tr>
      </thead>
      <tbody>
        {steps.map((step) => (
          <tr key={step.id} id={`${prefix}-${step.id}`} className="target:bg-uv-wash">
            <Td>{step.label}</Td>
            <Td className="num">{step.symbol}</Td>
            <Td numeric>{valueText(step.value)}</Td>
            <Td className="aside">{step.unit}</Td>
            <Td className="text-sm text-ink-2">{step.source}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/**
 * The working of a calculation as the engine recorded it: what was given in a table, then every derived line
 * with its formula, the numbers put in, and links to the lines it was made from. `prefix` keeps the anchors
 * of several workings on one page apart; `behind` are lines that the links may name without being shown again.
 */
export function WorkingList({
  steps,
  prefix,
  behind = [],
}: {
  steps: readonly WorkingStep[];
  prefix: string;
  behind?: readonly WorkingStep[];
}) {
  const known = new Map([...behind, ...steps].map((step) => [step.id, step]));
  const given = steps.filter((step) => step.inputs.length === 0);
  const derived = steps.filter((step) => step.inputs.length > 0);
  return (
    <div className="grid gap-4">
      <p className="text-sm text-ink-2">
        Every line was written by the calculation itself, with the values it had. Numbers here show up to{' '}
        {DIGITS} significant digits; it calculates with all of them.
      </p>
      <ol className="rounded-card border">
        {derived.map((step) => (
          <Derived key={step.id} step={step} known={known} prefix={prefix} />
        ))}
      </ol>
      {given.length > 0 && (
        <div className="overflow-hidden rounded-card border">
          <Given steps={given} prefix={prefix} />
        </div>
      )}
    </div>
  );
}
