import { isWavelengthWord, signalFromText, xUnitFromText } from '../header-words';
import type { XUnit } from '../types';
import { uncommented } from './header-rows';

/** What the text before a table declares, whatever its layout. */
export interface HeaderFacts {
  /** Records of the form "key: value", as they stand. */
  readonly records: Readonly<Record<string, string>>;
  /** Names and units of the columns, where records list them. */
  readonly declared: readonly string[];
  readonly missing: readonly number[];
  readonly xUnit?: XUnit;
  readonly signalText: string;
  readonly sample: string;
}

const MOST_LINES = 400;
/** What a line declares stands at its head. */
const LONGEST_LINE = 2000;

/** Search the header text: records, declared columns and missing values, unit of x, what was measured, sample. */
export function headerFacts(headerText: string): HeaderFacts {
  const lines = headerText
    .split(/\r\n|\n\r|\n|\r/, MOST_LINES)
    .map((line) => (line.length > LONGEST_LINE ? line.slice(0, LONGEST_LINE) : line));
  const records: Record<string, string> = {};
  for (const line of lines) {
    const record = recordOf(line);
    if (record && records[record.key] === undefined) records[record.key] = record.value;
  }
  const xUnit = unitInLines(lines, records);
  return {
    records,
    declared: declaredColumns(records, lines),
    missing: declaredMissing(lines),
    ...(xUnit ? { xUnit } : {}),
    signalText: signalInRecords(records) || coefficientIn(lines),
    sample: sampleName(records),
  };
}

function recordOf(line: string): { key: string; value: string } | undefined {
  if (line.length > 500) return undefined;
  const match = /^\s*["/]?([\p{L}][\p{L}\d .()/%_-]{0,50}?)"?\s*[:=;,\t]\s*"?(.*?)"?[\s;,]*$/u.exec(
    uncommented(line),
  );
  const [, key = '', value = ''] = match ?? [];
  if (key === '' || value.trim() === '') return undefined;
  return { key: key.trim(), value: value.trim() };
}

/** "/fields=" with "/units=", or a list of "{name: …, unit: …}" in comments. */
function declaredColumns(records: Readonly<Record<string, string>>, lines: readonly string[]): string[] {
  const fields = records['fields']?.split(',').map((field) => field.trim());
  if (fields) {
    const units = records['units']?.split(',').map((unit) => unit.trim()) ?? [];
    return fields.map((field, i) =>
      units[i] && !/^(?:none|unitless|1)$/i.test(units[i]) ? `${field} (${units[i]})` : field,
    );
  }
  const declared: string[] = [];
  for (const line of lines) {
    const column = /\{\s*name:\s*['"]?([^,'"}]+)['"]?\s*(?:,\s*unit:\s*['"]?([^,'"}]+)['"]?)?/.exec(line);
    if (column)
      declared.push(column[2] ? `${column[1]?.trim()} (${column[2].trim()})` : (column[1]?.trim() ?? ''));
  }
  return declared;
}

function declaredMissing(lines: readonly string[]): number[] {
  const values: number[] = [];
  for (const spaced of lines) {
    const line = spaced.replace(/[\s_-]{3,}/g, ' ');
    const match =
      /(?:missing|no[\s_-]?data|fill|bad|above_detection_limit|below_detection_limit)[\s_-]*(?:values?|data|flag)?\s*[=:]\s*(-?\d[\d.]*(?:e[+-]?\d+)?)/i.exec(
        line,
      );
    if (match) values.push(Number(match[1]));
  }
  return values.filter((value) => Number.isFinite(value));
}

function unitInLines(lines: readonly string[], records: Readonly<Record<string, string>>): XUnit | undefined {
  for (const [key, value] of Object.entries(records)) {
    if (/^(?:x[\s_-]?(?:axis|unit|label|data)|abscissa)/i.test(key)) {
      const unit = xUnitFromText(value);
      if (unit) return unit;
    }
  }
  for (const line of lines) {
    if (
      !isWavelengthWord(line) &&
      !/\b(?:scan|range|bereich|from|start|interval|data pitch|step)\b/i.test(line)
    )
      continue;
    const unit = xUnitFromText(line);
    if (unit) return unit;
  }
  return undefined;
}

function signalInRecords(records: Readonly<Record<string, string>>): string {
  for (const [key, value] of Object.entries(records)) {
    if (
      !/^(?:y[\s_-]?(?:axis|unit|label|mode)|ordinate|data[\s_]?(?:mode|type)|photometric(?: mode)?|measuring mode|measurement(?: mode| type)?|mode|quantity)\b/i.test(
        key,
      )
    )
      continue;
    if (signalFromText(value)) return value;
  }
  return '';
}

/** A header that speaks of a coefficient or a refractive index means columns that are no absorbance. */
function coefficientIn(lines: readonly string[]): string {
  for (const line of lines) {
    const words =
      /refractive ind(?:ex|ices)|(?:absorption )?cross.?sections?|quantum yields?|molar absorptivit(?:y|ies)|extinction coefficients?/i.exec(
        line,
      );
    if (words) return words[0];
  }
  return '';
}

function sampleName(records: Readonly<Record<string, string>>): string {
  for (const [key, value] of Object.entries(records)) {
    if (
      /^(?:sample(?:[\s_-]?(?:name|id))?|probe(?:nname)?|name|title|titel|bezeichnung|\u00e9chantillon|muestra|campione)$/i.test(
        key,
      )
    )
      return value;
  }
  return '';
}
