import { renderToStaticMarkup as render } from 'react-dom/server';
import { describe, expect, test } from 'vitest';

import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { Pill } from '@/components/ui/pill';
import { ProgressBar } from '@/components/ui/progress-bar';
import { SegmentedControl } from '@/components/ui/radio-group';
import { Select } from '@/components/ui/select';
import { TextArea } from '@/components/ui/text-area';
import type { FailedForm } from '@/lib/form-state';

const failed: FailedForm = {
  status: 'failed',
  code: 'INVALID_INPUT',
  message: 'One field needs another look',
  fields: { path: ['Path length must be above zero'] },
  values: { path: '-3', unit: 'mol/L', note: 'typed', model: 'proportional' },
};
const options = ['mg/L', 'mol/L'].map((value) => ({ value, label: value }));

describe('Field', () => {
  test('ties its label, hint and error to the input, and keeps what was typed', () => {
    const html = render(
      <Field name="path" label="Path length" hint="inside the cell" initial="10" failed={failed} />,
    );
    const id = /<label for="([^"]+)"/.exec(html)?.[1];
    expect(html).toContain(`id="${id}"`);
    expect(html).toContain('value="-3"');
    expect(html).toContain('aria-invalid="true"');
    expect(html).toContain(`aria-describedby="${id}-error ${id}-hint"`);
    expect(html).toContain(`<p id="${id}-error"`);
    expect(html).toContain('Path length must be above zero');
  });
  test('starts from its initial value and says nothing before it was sent', () => {
    const html = render(<Field name="path" label="Path length" initial="10" />);
    expect(html).toContain('value="10"');
    expect(html).not.toContain('aria-invalid=');
    expect(html).not.toContain('aria-describedby=');
  });
  test('leaves a controlled value alone', () => {
    expect(
      render(<Field name="path" label="p" failed={failed} value="7" onChange={() => undefined} />),
    ).toContain('value="7"');
  });
});

test('choices and texts refill from the refused form', () => {
  expect(
    render(<Select name="unit" label="Unit" initial="mg/L" options={options} failed={failed} />),
  ).toContain('<option value="mol/L" selected="">');
  expect(render(<TextArea name="note" label="Note" failed={failed} />)).toContain('>typed</textarea>');
  const choices = ['linear', 'proportional'].map((value) => ({ value, label: value }));
  const radios = render(
    <SegmentedControl name="model" label="Line" initial="linear" choices={choices} failed={failed} />,
  );
  expect(/<input[^>]*checked=""[^>]*>/.exec(radios)?.[0]).toContain('value="proportional"');
});

test('a box that was not ticked stays so, though it starts ticked', () => {
  expect(render(<Checkbox name="own" label="Own" defaultChecked failed={failed} />)).not.toContain(
    'checked=""',
  );
  expect(render(<Checkbox name="own" label="Own" defaultChecked />)).toContain('checked=""');
});

test('a button with something to do does not send its form; one without does', () => {
  expect(render(<Button onClick={() => undefined}>Copy</Button>)).toContain('type="button"');
  expect(render(<Button>Save</Button>)).toContain('type="submit"');
});

test('a refusal is an alert, a thing done is a status, and an untouched form is silent', () => {
  expect(render(<FormAlert state={failed} />)).toContain('role="alert"');
  expect(render(<FormAlert state={{ status: 'done', message: 'Saved' }} />)).toContain('role="status"');
  expect(render(<FormAlert state={{ status: 'idle' }} />)).toBe('');
});

test('no two tones share a shape', () => {
  const shapes = (['order', 'decide', 'stop', 'note', 'plain'] as const).map(
    (tone) => / d="([^"]+)"/.exec(render(<Pill tone={tone}>word</Pill>))?.[1],
  );
  expect(new Set(shapes).size).toBe(5);
});

test('progress stays between 0 and 100, and is unsaid while it is unknown', () => {
  expect(render(<ProgressBar label="Upload" fraction={1.4} />)).toContain('aria-valuenow="100"');
  expect(render(<ProgressBar label="Upload" fraction={null} />)).not.toContain('aria-valuenow');
});
