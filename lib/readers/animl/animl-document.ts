import { ReaderError } from '../types';
import { scanXml } from './scan-xml';

/** A stretch of values of a series, from an index on. */
export interface ValueSet {
  readonly kind: 'individual' | 'encoded' | 'increment';
  readonly startIndex: number;
  readonly endIndex: number;
  readonly values: number[];
  /** Texts that should be numbers and are none, by place in `values`. */
  readonly unreadable: Map<number, string>;
  base64: string;
}

export interface AnimlSeries {
  readonly name: string;
  readonly dependency: string;
  readonly type: string;
  readonly sets: ValueSet[];
  unit: string;
  quantity: string;
  readonly at: number;
}

export interface AnimlSeriesSet {
  readonly name: string;
  readonly length: number;
  readonly step: string;
  readonly technique: string;
  readonly samples: readonly string[];
  readonly series: AnimlSeries[];
  readonly at: number;
}

export interface AnimlDocument {
  readonly sets: readonly AnimlSeriesSet[];
  readonly records: Readonly<Record<string, string>>;
  readonly complete: boolean;
}

const VALUES = new Set(['D', 'F', 'I', 'L', 'S']);
const SETS: Readonly<Record<string, ValueSet['kind']>> = {
  IndividualValueSet: 'individual',
  EncodedValueSet: 'encoded',
  AutoIncrementedValueSet: 'increment',
};

/** Collect the series of an AnIML document, and the parameters and names that describe them. */
export function readAnimlDocument(text: string): AnimlDocument {
  const reader = new AnimlScan();
  scanXml(text, reader);
  return reader.document();
}

class AnimlScan {
  private readonly sets: AnimlSeriesSet[] = [];
  private readonly samples: string[] = [];
  private readonly records: Record<string, string> = {};
  private step = '';
  private technique = '';
  private parameter = '';
  private series: AnimlSeries | undefined;
  private values: ValueSet | undefined;
  private content = '';
  private closed = false;

  open(name: string, attributes: Readonly<Record<string, string>>, at: number): void {
    this.content = '';
    const called = attributes['name'] ?? '';
    if (name === 'Sample') this.samples.push(called);
    else if (name === 'ExperimentStep') this.step = called;
    else if (name === 'Technique') this.technique = called;
    else if (name === 'Parameter') this.parameter = called;
    else if (name === 'SeriesSet') this.openSet(called, attributes, at);
    else if (name === 'Series') this.openSeries(called, attributes, at);
    else if (SETS[name]) this.openValues(SETS[name], attributes);
    else if (name === 'Unit' && this.series && this.parameter === '') {
      this.series.unit = attributes['label'] ?? '';
      this.series.quantity = attributes['quantity'] ?? '';
    } else if (name === 'Unit' && this.records[this.parameter])
      this.records[this.parameter] += ` ${attributes['label'] ?? ''}`;
  }

  text(content: string): void {
    this.content += content;
  }

  close(name: string): void {
    if (VALUES.has(name)) this.addValue(this.content.trim());
    else if (name === 'EncodedValueSet' && this.values) this.values.base64 = this.content;
    else if (name === 'Series') this.series = undefined;
    else if (name === 'Parameter') this.parameter = '';
    else if (name === 'AnIML') this.closed = true;
    if (SETS[name]) this.values = undefined;
    this.content = '';
  }

  private openSet(name: string, attributes: Readonly<Record<string, string>>, at: number): void {
    const length = Number(attributes['length'] ?? NaN);
    this.sets.push({
      name,
      length,
      step: this.step,
      technique: this.technique,
      samples: this.samples,
      series: [],
      at,
    });
  }

  private openSeries(name: string, attributes: Readonly<Record<string, string>>, at: number): void {
    const set = this.sets[this.sets.length - 1];
    if (!set) return;
    this.series = {
      name,
      dependency: attributes['dependency'] ?? '',
      type: attributes['seriesType'] ?? '',
      sets: [],
      unit: '',
      quantity: '',
      at,
    };
    set.series.push(this.series);
  }

  private openValues(kind: ValueSet['kind'], attributes: Readonly<Record<string, string>>): void {
    const startIndex = Number(attributes['startIndex'] ?? 0);
    const endIndex = Number(attributes['endIndex'] ?? NaN);
    this.values = {
      kind,
      startIndex: Number.isInteger(startIndex) && startIndex >= 0 ? startIndex : 0,
      endIndex,
      values: [],
      unreadable: new Map(),
      base64: '',
    };
    this.series?.sets.push(this.values);
  }

  private addValue(text: string): void {
    if (this.values) {
      const value = text === '' ? NaN : Number(text);
      if (!Number.isFinite(value)) this.values.unreadable.set(this.values.values.length, text);
      this.values.values.push(Number.isFinite(value) ? value : NaN);
    } else if (this.parameter !== '') this.records[this.parameter] = text;
  }

  document(): AnimlDocument {
    if (this.sets.length === 0)
      throw new ReaderError(
        'NO_TABLE',
        'This AnIML document holds no series of values. Export the spectrum again, with its points.',
      );
    return { sets: this.sets, records: this.records, complete: this.closed };
  }
}
