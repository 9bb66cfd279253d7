/**
 * What a form knows after it was sent. `values` refills the inputs of a refused form, so that nothing typed is
 * lost; it never holds a secret. `fields` carries the sentences that belong to single inputs, by input name.
 * `shownOnce` is a secret that was made just now and is never shown again (a link, a token).
 */
export type FormState =
  | { status: 'idle' }
  | { status: 'done'; message?: string; shownOnce?: string }
  | {
      status: 'failed';
      code: string;
      message: string;
      fields: Record<string, string[]>;
      values: Record<string, string>;
    };

export type FailedForm = Extract<FormState, { status: 'failed' }>;
