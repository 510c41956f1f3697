/** What the commands share: options, readers of their values, examples in the help. */
import { InvalidArgumentError, Option } from 'commander';
import { styled } from '../output/style.js';

/** Hears the exit code of the command that ran. */
export type Keep = (code: number | undefined) => void;

export function wholeNumber(text: string): number {
  const value = Number(text);
  if (!/^\d+$/.test(text) || value < 1 || value > Number.MAX_SAFE_INTEGER)
    throw new InvalidArgumentError('Expected a whole number from 1.');
  return value;
}

export function periods(text: string): number[] {
  return text.split(/[,;]/).map((part) => {
    const value = Number(part);
    if (part.trim() === '' || !(value >= 0 && value < Infinity))
      throw new InvalidArgumentError('Expected periods in seconds, for instance 0.2,1.');
    return value;
  });
}

export function positive(text: string): number {
  const value = Number(text);
  if (text.trim() === '' || !(value > 0 && value < Infinity))
    throw new InvalidArgumentError('Expected a number over 0.');
  return value;
}

export function seconds(text: string): number {
  const value = Number(text);
  if (text.trim() === '' || !(value >= 0 && value < Infinity))
    throw new InvalidArgumentError('Expected seconds, 0 or more.');
  return value;
}

export function band(text: string): [number, number] {
  const [low = NaN, high = NaN, ...more] = text.split(':').map((part) => (part.trim() === '' ? NaN : Number(part)));
  if (!(low > 0 && high > low && high < Infinity) || more.length > 0)
    throw new InvalidArgumentError('Expected two frequencies, the lower first, for instance 0.5:3.');
  return [low, high];
}

/** A coordinate of at most so many degrees, east and north positive. */
export function degrees(most: number): (text: string) => number {
  return (text) => {
    const value = Number(text);
    if (text.trim() === '' || !(Math.abs(value) <= most))
      throw new InvalidArgumentError(`Expected degrees, -${String(most)} to ${String(most)}.`);
    return value;
  };
}

export const units = (): Option =>
  new Option('--units <system>', 'units of the output').choices(['si', 'us']).default('si');
export const json = (): Option => new Option('--json', 'print JSON');
export const study = (): Option =>
  new Option('--study <file>', 'the study file (default: study.yaml, or the only .yaml file here)');
export const run = (): Option =>
  new Option('--run <number>', 'the run (default: the newest of the study)').argParser(wholeNumber);

export function examples(...lines: readonly string[]): string {
  return `\n${styled('bold', lines.length > 1 ? 'Examples:' : 'Example:')}\n${lines.map((line) => `  ${line}`).join('\n')}`;
}
