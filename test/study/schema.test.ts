import { readFileSync } from 'node:fs';
import Ajv from 'ajv';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { COLUMNS } from '../../src/engineering/columns.js';
import { CODE_EDITIONS } from '../../src/study/code-editions.js';
import { studyJsonSchema } from '../../src/study/schema.js';
import { SPECTRUM_CODES } from '../../src/study/spectrum-codes.js';
import { SAMPLE } from './sample.js';

interface Node {
  readonly properties?: Readonly<Record<string, Node>>;
  readonly description?: string;
  readonly anyOf?: readonly Node[];
  readonly oneOf?: readonly Node[];
  readonly items?: Node;
  readonly additionalProperties?: Node | boolean;
}

function undescribed(node: Node, path: string): string[] {
  const own = Object.entries(node.properties ?? {}).flatMap(([key, child]) => [
    ...(child.description === undefined ? [`${path}.${key}`] : []),
    ...undescribed(child, `${path}.${key}`),
  ]);
  const more = typeof node.additionalProperties === 'object' ? [node.additionalProperties] : [];
  const inner = [...(node.anyOf ?? []), ...(node.oneOf ?? []), ...(node.items ? [node.items] : []), ...more];
  return [...own, ...inner.flatMap((child) => undescribed(child, `${path}.*`))];
}

describe('studyJsonSchema', () => {
  // Judged by ajv, a JSON Schema validator that knows nothing of our schema library.
  const validate = new Ajv({ allErrors: true }).compile(studyJsonSchema());

  it.each([
    ['the sample', SAMPLE],
    ['the demo study', readFileSync('data-demo/study.yaml', 'utf8')],
  ])('accepts %s', (_name, text) => {
    validate(parse(text));
    expect(validate.errors).toBeNull();
  });

  it('refuses a key or a word that the program refuses', () => {
    expect(validate(parse(SAMPLE.replace('title:', 'titel:')))).toBe(false);
    expect(validate(parse(SAMPLE.replace('us-ubc-asce7', 'other')))).toBe(false);
    expect(validate(parse(SAMPLE.replace('ground: C', 'ground: F')))).toBe(false);
    expect(validate(parse(SAMPLE.replace('site_class: Ground', 'site_class: {column: Ground, unit: m}')))).toBe(false);
  });

  it('describes every key, for the editor', () => {
    expect(undescribed(studyJsonSchema() as Node, '')).toEqual([]);
  });

  it('offers every inventory column, spectrum code and code edition', () => {
    const text = JSON.stringify(studyJsonSchema());
    for (const word of [...COLUMNS.map(({ name }) => name), ...SPECTRUM_CODES, ...CODE_EDITIONS]) {
      expect(text).toContain(`"${word}"`);
    }
  });
});
