/**
 * What a form knows after it was sent. `values` refills the inputs of a refused form, so that nothing typed is
 * lost; it never holds a secret. `fields` carries the sentences that belong to single inputs, by input name.
 */
export type FormState =
  | { status: 'idle' }
  | { status: 'done'; message?: string }
  | {
      status: 'failed';
      code: string;
      message: string;
      fields: Record<string, string[]>;
      values: Record<string, string>;
    };

export type FailedForm = Extract<FormState, { status: 'failed' }>;
