import type { ChangeEvent } from 'react';

/** Sentences by the path of their field, such as "calculation.formulaMass". */
export type Issues = Readonly<Record<string, string>>;

type Control = HTMLInputElement | HTMLTextAreaElement | HTMLSelectElement;

/** Name, value, error and change of one text of a group: spread into a field. */
export function boundText<T extends object, K extends keyof T & string>(
  group: string,
  texts: T,
  change: (next: T) => void,
  issues: Issues,
  key: K,
) {
  return {
    name: `${group}.${key}`,
    value: String(texts[key]),
    error: issues[`${group}.${key}`],
    onChange: (event: ChangeEvent<Control>) => change({ ...texts, [key]: event.currentTarget.value }),
  };
}
